/** One event of an event stream. */
export interface StreamEvent {
  /** Its name; `message` where it has none. */
  readonly name: string;
  readonly data: string;
}

/**
 * Reads `text/event-stream` piece by piece as the HTML standard of the WHATWG has it ("Interpreting an event stream"), which
 * a browser's own reader does not offer with a bearer token. Ids and retry times are passed over: whoever comes back here
 * reads anew, at a pace of their own. Give it decoded text; it returns the events that the text completes.
 */
export function eventStreamReader(): (text: string) => StreamEvent[] {
  let rest = '';
  let name = '';
  let data: string[] = [];
  let begun = false;

  const take = (line: string, events: StreamEvent[]): void => {
    if (line === '') {
      // Without data there is no event, whatever its name.
      if (data.length > 0) events.push({ name: name || 'message', data: data.join('\n') });
      name = '';
      data = [];
      return;
    }
    const colon = line.indexOf(':');
    const field = colon === -1 ? line : line.slice(0, colon);
    const value = colon === -1 ? '' : line.slice(colon + 1).replace(/^ /, '');
    if (field === 'event') name = value;
    else if (field === 'data') data.push(value);
  };

  return (text) => {
    const events: StreamEvent[] = [];
    rest += text;
    if (!begun && rest !== '') {
      begun = true;
      rest = rest.replace(/^\uFEFF/, '');
    }
    // A carriage return at the very end may be half of a line's end: it waits for what follows.
    for (let end = /\r\n|\n|\r(?!$)/.exec(rest); end; end = /\r\n|\n|\r(?!$)/.exec(rest)) {
      take(rest.slice(0, end.index), events);
      rest = rest.slice(end.index + end[0].length);
    }
    return events;
  };
}

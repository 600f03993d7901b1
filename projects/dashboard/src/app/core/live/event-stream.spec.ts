import { eventStreamReader, type StreamEvent } from './event-stream';

const readWhole = (text: string): StreamEvent[] => eventStreamReader()(text);
const readBitByBit = (text: string): StreamEvent[] => {
  const read = eventStreamReader();
  return [...text].flatMap((letter) => read(letter));
};
const message = (data: string): StreamEvent => ({ name: 'message', data });

/** The first four are the examples of the HTML standard, "Server-sent events", section on parsing. */
const CASES: [what: string, text: string, events: StreamEvent[]][] = [
  ['data of three lines', 'data: YHOO\ndata: +2\ndata: 10\n\n', [message('YHOO\n+2\n10')]],
  [
    'a comment, ids, and a space kept after the first',
    ': test stream\n\ndata: first event\nid: 1\n\ndata:second event\nid\n\ndata:  third event\n\n',
    [message('first event'), message('second event'), message(' third event')],
  ],
  ['data without a value', 'data\n\ndata\ndata\n\ndata:', [message(''), message('\n')]],
  [
    'a space after the colon or none',
    'data:test\n\ndata: test\n\n',
    [message('test'), message('test')],
  ],
  [
    'a name',
    'event: change\ndata: {}\n\ndata: x\n\n',
    [{ name: 'change', data: '{}' }, message('x')],
  ],
  ['a name without data', 'event: change\n\ndata: x\n\n', [message('x')]],
  ['an unknown field and a retry', 'retry: 5000\nother: 1\ndata: x\n\n', [message('x')]],
  [
    'ends of lines of the other two kinds',
    'data: a\r\n\r\ndata: b\r\rdata: c\r\n\n',
    [message('a'), message('b'), message('c')],
  ],
  ['a byte order mark', '\uFEFFdata: x\n\n', [message('x')]],
  ['colons in a value', 'data: {"a":1}\n\n', [message('{"a":1}')]],
  ['an event that is not over', 'data: a\n\ndata: b\n', [message('a')]],
  ['only breaths', ':\n\n:\n\n', []],
];

describe('eventStreamReader', () => {
  it.each(CASES)('given %s, reads its events', (_, text, events) => {
    expect(readWhole(text)).toEqual(events);
  });

  it.each(CASES)('given %s letter by letter, reads the same', (_, text, events) => {
    expect(readBitByBit(text)).toEqual(events);
  });
});

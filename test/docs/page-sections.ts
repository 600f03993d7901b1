/** One entry of a Markdown page: what stands under a heading of level 3. */
export interface Entry {
  /** The heading of level 2 that it belongs to. */
  part: string;
  heading: string;
  /** What stands in code in the heading. */
  marks: string[];
  text: string;
}

/** The entries of a page, in order. */
export function entriesOf(markdown: string): Entry[] {
  return markdown.split(/^## /m).flatMap((whole) => {
    const [before = '', ...entries] = whole.split(/^### /m);
    const part = firstLine(before);
    return entries.map((entry) => {
      const heading = firstLine(entry);
      return { part, heading, marks: codeIn(heading), text: entry.slice(heading.length).trim() };
    });
  });
}

/** What stands in code, span by span. */
export function codeIn(markdown: string): string[] {
  return [...markdown.matchAll(/`([^`\n]+)`/g)].map((span) => span[1] ?? '');
}

function firstLine(text: string): string {
  return text.split('\n', 1)[0] ?? '';
}

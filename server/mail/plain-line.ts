/** A text as part of a line: nothing in it may start a line, or turn around what follows. */
export function oneLine(text: string): string {
  return text
    .replace(/[\p{Cc}\p{Cs}\p{Zl}\p{Zp}\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069]+/gu, ' ')
    .replace(/ {2,}/g, ' ')
    .trim();
}

/** A text as it stands in markup: nothing in it is read as a tag, an attribute or an entity. */
export function escaped(text: string): string {
  const entities: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  };
  return text.replace(/[&<>"']/g, (character) => entities[character] ?? character);
}

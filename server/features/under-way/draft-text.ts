import type { JobDraft } from '#shared/contracts/under-way';

/** A job under way as text: the same content in any order of its fields is the same text. */
export function draftText(content: JobDraft): string {
  return JSON.stringify(content, (_key, value: unknown) => inOrder(value));
}

function inOrder(value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(Object.entries(value).sort(([a], [b]) => (a < b ? -1 : 1)));
}

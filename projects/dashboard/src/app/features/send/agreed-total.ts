import type { DraftDocument } from './draft-document';

/** What was quoted and what was agreed beyond it, together in minor units; `undefined` without a quote. */
export function agreedTotal({ estimate, agreedExtras }: DraftDocument): number | undefined {
  if (estimate?.priceCents === undefined) return undefined;
  const beyond = (agreedExtras ?? []).reduce((sum, { priceCents }) => sum + (priceCents ?? 0), 0);
  return estimate.priceCents + beyond;
}

import type { JobContent } from '#shared/contracts/jobs';
import { between, chance, pickWeighted, wholeBetween, type Random } from './random-draws';
import type { Finding } from './rot-findings';

export type AgreedExtra = NonNullable<JobContent['agreedExtras']>[number];

/** What is agreed with the owner beyond the quote, and what of it reaches the bill. */
export interface ExtraWork {
  findings: Finding[];
  agreedExtras: AgreedExtra[];
  boughtInCents: number;
  /** Cents that the bill adds to the quoted price. */
  billedExtrasCents: number;
}

/** Of what was agreed by word of mouth, this share is forgotten when the bill is written. */
const FORGOTTEN = 0.2;

/** Agrees extra work on a day. `saleHourCents` is what an hour is sold for. */
export function agreeExtras(
  random: Random,
  findings: Finding[],
  years: number,
  on: string,
  saleHourCents: number,
): ExtraWork {
  const work: ExtraWork = { findings, agreedExtras: [], boughtInCents: 0, billedExtrasCents: 0 };
  agreeRepair(random, work, on, saleHourCents);
  if (chance(random, 0.02 + 0.004 * Math.min(years, 24))) {
    const minutes = wholeBetween(random, 4, 12) * 5;
    agree(random, work, {
      on,
      minutes,
      priceCents: whole(minutes, saleHourCents),
      note: chance(random, 0.5)
        ? 'Seized arch-liner screws drilled out'
        : 'Packed mud dug out by hand',
    });
  }
  if (chance(random, 0.035)) {
    work.boughtInCents = Math.round(between(random, 25, 120)) * 100;
    const priceCents = Math.round((work.boughtInCents * 1.25) / 500) * 500;
    agree(random, work, { on, minutes: 0, priceCents, note: 'Arch liner replaced' });
  }
  return work;
}

function agreeRepair(random: Random, work: ExtraWork, on: string, saleHourCents: number): void {
  const minutes = work.findings.reduce((all, finding) => all + (finding.repairMinutes ?? 0), 0);
  if (minutes === 0 || !chance(random, 0.74)) return;
  const agreed = Math.round((minutes * between(random, 0.65, 1)) / 5) * 5;
  const extra = {
    on,
    minutes: agreed,
    priceCents: whole(agreed, saleHourCents),
    note: 'Rot repair',
  };
  work.agreedExtras.push(extra);
  if (chance(random, FORGOTTEN)) return;
  work.billedExtrasCents += extra.priceCents;
  work.findings = charged(work.findings, minutes, extra.priceCents);
}

function agree(random: Random, work: ExtraWork, extra: AgreedExtra): void {
  work.agreedExtras.push(extra);
  if (!chance(random, FORGOTTEN)) work.billedExtrasCents += extra.priceCents ?? 0;
}

/** Spreads a price over the repaired findings by their minutes; the last one takes what rounding leaves. */
function charged(findings: readonly Finding[], minutes: number, priceCents: number): Finding[] {
  let left = priceCents;
  let minutesLeft = minutes;
  return findings.map((finding) => {
    const own = finding.repairMinutes ?? 0;
    if (own === 0) return finding;
    const cents = own === minutesLeft ? left : Math.round((left * own) / minutesLeft);
    left -= cents;
    minutesLeft -= own;
    return { ...finding, chargedCents: cents };
  });
}

/** What is billed: the quote less what is given away, and the extras. Now and then something is knocked off for a good customer. */
export function billTotal(
  random: Random,
  quotedCents: number,
  billedExtrasCents: number,
  givenAway: number,
): number {
  const courtesy = chance(random, 0.06) ? between(random, 0.02, 0.08) : 0;
  const drifted = givenAway * between(random, 0.7, 1.3);
  return Math.round((quotedCents * (1 - courtesy - drifted)) / 100) * 100 + billedExtrasCents;
}

/** Days from completion to the bill. About half are written at once, some take weeks, a forgotten one turns up when the year is closed. */
export function billDelayDays(random: Random, slowness: number): number {
  if (chance(random, 0.006)) return wholeBetween(random, 250, 420);
  const [from, to] = pickWeighted(random, DELAYS);
  return Math.round(wholeBetween(random, from, to) * (from === 0 ? 1 : slowness));
}

const DELAYS: readonly (readonly [readonly [number, number], number])[] = [
  [[0, 0], 42],
  [[1, 1], 18],
  [[2, 4], 17],
  [[5, 8], 14],
  [[11, 21], 7],
  [[22, 50], 1.5],
];

function whole(minutes: number, hourCents: number): number {
  return Math.round((minutes * hourCents) / 60 / 500) * 500;
}

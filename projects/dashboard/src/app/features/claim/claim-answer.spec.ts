import type { ClaimRow } from '#shared/contracts/claim-list';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatDate } from '../../ui/format';
import { answerClaim } from './claim-answer';
import type { ReadClaim } from './typed-claim';

const CLAIM: ReadClaim = {
  branch: 'HAV',
  claimRef: 'W-1',
  revision: 1,
  jobRef: '04/17',
  madeOn: '2026-01-12',
  zone: 'floor',
  cause: 'damage',
  decision: 'open',
  labourMinutes: 0,
  productMl: 0,
};
const JOB = {
  completedOn: '2024-02-12',
  warrantyMonths: 24,
  vehicle: {
    make: 'Velder',
    model: 'Tessock',
    bodyType: 'hatchback' as const,
    firstRegistered: '2009-05',
  },
};
const ROW = { month: 23, inWarranty: true, counted: true, vehicle: JOB.vehicle } as ClaimRow;

function words(parts: readonly AnswerPart[]): string {
  return parts
    .map((part) => {
      if (typeof part === 'string') return part;
      if ('figure' in part) return part.figure;
      return 'quiet' in part ? part.quiet : part.text;
    })
    .join('');
}
const said = (claim: Partial<ReadClaim>, row: Partial<ClaimRow> = {}, job: object = {}) => {
  const known = { job: { ...JOB, ...job }, row: { ...ROW, ...row } };
  const { sentence, second } = answerClaim({ ...CLAIM, ...claim }, known);
  return { first: words(sentence), second: words(second) };
};

describe('answerClaim', () => {
  it('of an open one, says since when, on which car and why it counts', () => {
    const { first, second } = said({});
    expect(first).toBe(`Open, made on ${formatDate('2026-01-12')}, claim W-1`);
    expect(second).toBe(
      `On job 04/17, Velder Tessock 2009. It counts: made in month 23 after the job, within the warranty, which runs to ${formatDate('2026-02-12')}.`,
    );
  });

  it('of one that waits, says what is proposed and never that it is decided', () => {
    const { first } = said({ proposedDecision: 'accepted', decidedOn: '2026-01-20' });
    expect(first).toBe('Waits for head office: accepted is proposed, claim W-1');
  });

  it('of one that was decided and waits with a raised cost, says what stands until then', () => {
    expect(said({ decision: 'goodwill', proposedDecision: 'accepted' }).first).toContain(
      'accepted is proposed; goodwill until then',
    );
  });

  it('of a refused one, says that it no longer counts', () => {
    const { first, second } = said(
      { decision: 'refused', decidedOn: '2026-01-20' },
      { counted: false },
    );
    expect(first).toContain(`Refused on ${formatDate('2026-01-20')}`);
    expect(second).toContain('It no longer counts: it was refused.');
  });

  it("of one after the warranty's end, says so with the day", () => {
    expect(said({}, { counted: false, inWarranty: false }).second).toContain(
      `after the warranty's end, which was ${formatDate('2026-02-12')}`,
    );
  });

  it('of one on a package without warranty, says so', () => {
    const { second } = said({}, { counted: false, inWarranty: false }, { warrantyMonths: 0 });
    expect(second).toContain('sold without a warranty');
  });

  it('leads to the job by an address that holds whatever its reference holds', () => {
    const { second } = answerClaim(CLAIM, { job: undefined, row: undefined });
    expect(second).toContainEqual({ text: 'job 04/17', link: '/jobs/HAV/04%2F17' });
  });
});

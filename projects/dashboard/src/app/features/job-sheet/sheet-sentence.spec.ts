import type { JobSheet } from '#shared/contracts/jobs';
import type { AnswerPart } from '../../ui/answer/answer';
import { sheetSentence, totalMinutes } from './sheet-sentence';

const KNOWN = { currency: 'EUR', packageName: 'full', branchName: 'Havnsund' };
const MONEY = {
  revenueCents: 87000,
  labourCents: 46500,
  productCents: 10500,
  consumablesCents: 270,
  boughtInCents: 0,
  feeCents: 5220,
  costCents: 57270,
  marginCents: 24510,
  marginShare: 0.2817,
  bridge: null,
};
function job(change: Partial<JobSheet>): JobSheet {
  return {
    jobRef: '0417',
    completedOn: '2026-01-28',
    vehicle: {
      make: 'Velder',
      model: 'Tessock',
      bodyType: 'hatchback',
      firstRegistered: '2009-05',
    },
    actual: { stages: { strip: 110, repair: 185 } },
    estimate: { priceCents: 78000, stages: { strip: 90 } },
    ...change,
  } as unknown as JobSheet;
}
const read = (parts: readonly AnswerPart[]) =>
  parts
    .map((part) =>
      typeof part === 'string'
        ? part
        : 'figure' in part
          ? part.figure
          : 'quiet' in part
            ? part.quiet
            : part.text,
    )
    .join('')
    .replaceAll('\u202f', ' ');

describe('sheetSentence', () => {
  it('of a billed job says the share it kept', () => {
    expect(read(sheetSentence(job({ money: MONEY }), KNOWN).sentence)).toBe(
      'Job 0417 kept 28 % of what it billed (€245 of €870).',
    );
  });

  it('of an unbilled job says its cost so far, as no margin is known', () => {
    const money = { ...MONEY, revenueCents: null, marginCents: null, marginShare: null };
    expect(read(sheetSentence(job({ money }), KNOWN).sentence)).toBe(
      'Job 0417 is not billed and has cost €573 so far.',
    );
  });

  it('of a job billed at nothing shows no share', () => {
    const money = { ...MONEY, revenueCents: 0, marginCents: -57270, marginShare: null };
    expect(read(sheetSentence(job({ money }), KNOWN).sentence)).toBe(
      'Job 0417 kept −€573 of €0 billed.',
    );
  });

  it('to a recorder says the labour and no money', () => {
    expect(read(sheetSentence(job({}), KNOWN).sentence)).toBe(
      'Job 0417 took 4 h 55 min of labour (1 h 30 min estimated).',
    );
  });

  it('with a cost missing says that the margin waits for it', () => {
    expect(read(sheetSentence(job({ money: null }), KNOWN).sentence)).toContain('margin waits');
  });
});

describe('totalMinutes', () => {
  it('of an estimate of 0 minutes has none (rule 12)', () => {
    expect(totalMinutes(job({ estimate: { priceCents: 1, stages: {} } })).estimate).toBeUndefined();
  });
});

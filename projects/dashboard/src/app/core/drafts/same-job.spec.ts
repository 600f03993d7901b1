import type { JobContent, JobSheet } from '#shared/contracts/jobs';
import { isSameJob } from './same-job';

const sent: JobContent = {
  vehicle: {
    make: 'Velder ',
    model: 'Tessock',
    bodyType: 'hatchback',
    firstRegistered: '2009-05',
  },
  package: 'full',
  completedOn: '2026-02-02',
  estimate: { priceCents: 89000, stages: { strip: 60, dry: 0 } },
  actual: { stages: { strip: 75 } },
  consumables: [{ kind: 'trim_clip', quantity: 2, unitCostCents: 150 }],
  findings: [
    {
      zone: 'sill_inner',
      side: 'left',
      seenAs: 'bubbling',
      structural: true,
      action: 'deferred',
      chargedCents: 0,
    },
  ],
  invoice: { number: '0417', issuedOn: '2026-02-02', totalCents: 91000 },
  notes: '',
};

/** As the server writes the same job out: trimmed, defaults spelt out, findings named. */
const written = {
  ...sent,
  vehicle: { ...sent.vehicle, make: 'Velder' },
  agreedExtras: [],
  products: [],
  boughtInCents: 0,
  estimate: { priceCents: 89000, stages: { strip: 60, dry: 0, mask: 0 } },
  findings: [{ ...sent.findings![0]!, ref: 'sill_inner/left/1', repairMinutes: 0 }],
};
const sheetOf = (more: object = {}): JobSheet =>
  ({
    ...written,
    branch: 'HAV',
    jobRef: '0417',
    revision: 1,
    receivedAt: '2026-02-02T06:31:00Z',
    source: 'form',
    comeBacks: [],
    warrantyMonths: 24,
    money: null,
    revisions: [],
    ...more,
  }) as unknown as JobSheet;

/** What a recorder reads of it. */
function unpriced(): JobSheet {
  const {
    money: _money,
    boughtInCents: _bought,
    ...rest
  } = sheetOf() as unknown as Record<string, unknown>;
  return {
    ...rest,
    findings: written.findings.map(({ chargedCents: _charged, ...finding }) => finding),
    consumables: sent.consumables?.map(({ unitCostCents: _unit, ...line }) => line),
    invoice: { number: '0417', issuedOn: '2026-02-02' },
  } as unknown as JobSheet;
}

describe('isSameJob', () => {
  it('given the sheet of what was sent, sees the same job', () => {
    expect(isSameJob(sent, sheetOf())).toBe(true);
  });

  it('given a sheet without the amounts its reader may not see, still sees the same job', () => {
    expect(isSameJob(sent, unpriced())).toBe(true);
  });

  it.each<[what: string, more: object]>([
    ['other minutes', { actual: { stages: { strip: 80 } } }],
    ['another package', { package: 'cavity' }],
    ['another bill', { invoice: { number: '0417', issuedOn: '2026-02-02', totalCents: 92000 } }],
    ['no finding', { findings: [] }],
  ])('given a sheet with %s, sees another', (_what, more) => {
    expect(isSameJob(sent, sheetOf(more))).toBe(false);
  });

  it('sent without a bill, takes the stored one for left alone', () => {
    const { invoice: _, ...unbilled } = sent;
    expect(isSameJob(unbilled, sheetOf())).toBe(true);
    expect(isSameJob({ ...unbilled, invoice: null }, sheetOf())).toBe(false);
  });
});

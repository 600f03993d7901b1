import type { JobSheet } from '#shared/contracts/jobs';
import { draftOfJob } from './draft-of-job';

describe('draftOfJob', () => {
  it('of a job on record, given what was worked out since and zeros that stand for nothing, takes what was sent', () => {
    const sheet = {
      branch: 'HAV',
      jobRef: '0417',
      revision: 2,
      vehicle: {
        make: 'Velder',
        model: 'Tessock',
        bodyType: 'hatchback',
        firstRegistered: '2009-05',
        odometerKm: 0,
      },
      package: 'full',
      completedOn: '2026-02-02',
      actual: { stages: { strip: 60, clean: 0 } },
      products: [{ product: 'CW1', ml: 0 }],
      consumables: [],
      boughtInCents: 0,
      findings: [
        {
          ref: 'floor/left/1',
          zone: 'floor',
          side: 'left',
          seenAs: 'surface',
          structural: false,
          action: 'deferred',
          repairMinutes: 0,
          note: '',
        },
      ],
      notes: '',
      invoice: null,
      money: null,
      revisions: [],
    } as unknown as JobSheet;
    expect(draftOfJob(sheet)).toEqual({
      vehicle: sheet.vehicle,
      package: 'full',
      completedOn: '2026-02-02',
      actual: { stages: { strip: 60 } },
      products: [{ product: 'CW1', ml: 0 }],
      findings: [
        {
          ref: 'floor/left/1',
          zone: 'floor',
          side: 'left',
          seenAs: 'surface',
          structural: false,
          action: 'deferred',
        },
      ],
    });
  });
});

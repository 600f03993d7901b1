import { checkDraft } from './check-draft';
import type { DraftDocument } from './draft-document';

const NOW = new Date('2026-02-02T10:00:00Z');
const WORLD = { today: '2026-02-02', isProduct: () => true, isPackage: () => true };

function whole(more: Partial<DraftDocument> = {}): DraftDocument {
  return {
    jobRef: '0417',
    vehicle: {
      make: 'Velder',
      model: 'Tessock',
      bodyType: 'hatchback',
      firstRegistered: '2009-05',
    },
    package: 'full',
    completedOn: '2026-02-02',
    actual: { stages: { strip: 90, repair: 60 } },
    ...more,
  };
}

describe('checkDraft', () => {
  it('of a whole job, given the least it needs, finds nothing', () => {
    expect(checkDraft(whole(), WORLD, NOW)).toEqual([]);
  });

  it('of a field left empty, given its own choices or length, says that it is missing', () => {
    const said = (path: string, draft: DraftDocument) =>
      checkDraft(draft, WORLD, NOW).find((one) => one.path === path)?.message;
    expect(said('/jobRef', { jobRef: ' ' })).toBe('is required');
    expect(said('/vehicle/bodyType', { vehicle: {} })).toBe('is required');
    expect(said('/jobRef', { jobRef: 'a/b' })).not.toBe('is required');
  });

  it('of an empty draft, given nothing, names every field that is missing by its path', () => {
    const paths = checkDraft({}, WORLD, NOW).map(({ path }) => path);
    expect(paths).toEqual(
      expect.arrayContaining([
        '/jobRef',
        '/vehicle/make',
        '/vehicle/bodyType',
        '/vehicle/firstRegistered',
        '/package',
        '/completedOn',
      ]),
    );
  });

  it('of findings, given more repair than the stage has, says it at both', () => {
    const findings: DraftDocument['findings'] = [
      {
        ref: 'floor/left/1',
        zone: 'floor',
        side: 'left',
        seenAs: 'bubbling',
        workedAs: 'holed',
        structural: false,
        action: 'patched',
        repairMinutes: 75,
      },
    ];
    const paths = checkDraft(whole({ findings }), WORLD, NOW).map(({ path }) => path);
    expect(paths).toEqual(['/actual/stages/repair', '/findings']);
  });

  it('of a finding, given it was patched and how it was worked is missing, names the finding by its reference', () => {
    const findings: DraftDocument['findings'] = [
      { ref: 'floor/left/1', zone: 'floor', side: 'left', seenAs: 'bubbling', action: 'patched' },
    ];
    const paths = checkDraft(whole({ findings }), WORLD, NOW).map(({ path }) => path);
    expect(paths).toContain('/findings/floor~1left~11/workedAs');
    expect(paths).toContain('/findings/floor~1left~11/structural');
  });

  it('of a bill, given no total, asks for it, but not of a recorder', () => {
    const document = whole({ invoice: { number: '12' } });
    expect(checkDraft(document, WORLD, NOW).map(({ path }) => path)).toEqual([
      '/invoice/totalCents',
    ]);
    expect(checkDraft(document, { ...WORLD, money: 'unseen' }, NOW)).toEqual([]);
  });

  it('of a day, given tomorrow, refuses it as the branch’s future', () => {
    const [problem] = checkDraft(whole({ completedOn: '2026-02-03' }), WORLD, NOW);
    expect(problem).toMatchObject({ path: '/completedOn' });
    expect(problem?.message).toContain('future');
  });
});

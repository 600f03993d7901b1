import { ROLES } from '#shared/domain/vocabulary';
import { checkPlacing } from './check-placing';

const KNOWN = { regions: new Set(['COAST']), branches: new Set(['AAA', 'BBB']) };
const paths = (raw: unknown) => checkPlacing(raw, KNOWN).map(({ path }) => path);

describe('checkPlacing', () => {
  it.each([
    ['recorder', 'branches'],
    ['site_manager', 'branches'],
    ['regional_lead', 'regions'],
    ['head_office', 'neither'],
  ])('given a %s, takes %s and nothing else (rule 65)', (role, wanted) => {
    const places = { regions: ['COAST'], branches: ['AAA'] };
    for (const regions of [undefined, [], places.regions]) {
      for (const branches of [undefined, [], places.branches]) {
        const has = { regions: !!regions?.length, branches: !!branches?.length };
        const expected = (['regions', 'branches'] as const)
          .filter((field) => has[field] !== (wanted === field))
          .map((field) => `/${field}`);
        expect(paths({ role, regions, branches })).toEqual(expected);
      }
    }
  });

  it('given codes that are not known, names each where it stands', () => {
    expect(checkPlacing({ role: 'recorder', branches: ['AAA', 'ZZZ', 'YYY'] }, KNOWN)).toEqual([
      { path: '/branches/1', message: 'there is no branch with the code "ZZZ"' },
      { path: '/branches/2', message: 'there is no branch with the code "YYY"' },
    ]);
  });

  it.each([undefined, null, 'text', 7, [], { role: 'king' }, { role: null, branches: 'AAA' }])(
    'given %j, leaves its shape to the contract',
    (raw) => expect(paths(raw)).toEqual([]),
  );

  it('given any role, says it in words', () => {
    for (const role of ROLES) {
      const { message } = checkPlacing({ role, regions: ['COAST'], branches: [] }, KNOWN)[0] ?? {
        message: '',
      };
      expect(message).not.toContain('_');
    }
  });
});

import fc from 'fast-check';
import type { Role } from '#shared/domain/vocabulary';
import { Scope, type ScopedBranch } from './scope';

const branch = (id: number, code: string, region: string): ScopedBranch => ({
  id,
  code,
  name: code,
  region,
  timeZone: 'UTC',
});
const all = [
  branch(1, 'DDD', 'HILLS'),
  branch(2, 'AAA', 'COAST'),
  branch(3, 'CCC', 'HILLS'),
  branch(4, 'BBB', 'COAST'),
];
const grant = (role: Role, branchIds: number[] = [], regionCodes: string[] = []) => ({
  role,
  branchIds,
  regionCodes,
});
const codes = (scope: Scope): string[] => scope.branches.map(({ code }) => code);

describe('Scope.ofGrant', () => {
  it('given each role, allows what it was given and sorts it by code', () => {
    expect(codes(Scope.ofGrant(all, grant('head_office')))).toEqual(['AAA', 'BBB', 'CCC', 'DDD']);
    expect(codes(Scope.ofGrant(all, grant('regional_lead', [], ['HILLS'])))).toEqual([
      'CCC',
      'DDD',
    ]);
    expect(codes(Scope.ofGrant(all, grant('site_manager', [1, 2])))).toEqual(['AAA', 'DDD']);
    expect(codes(Scope.ofGrant(all, grant('recorder', [4])))).toEqual(['BBB']);
  });

  it('given places that the role does not go by, allows none of them', () => {
    expect(codes(Scope.ofGrant(all, grant('regional_lead', [1, 2], [])))).toEqual([]);
    expect(codes(Scope.ofGrant(all, grant('recorder', [], ['COAST'])))).toEqual([]);
  });

  it('given a push key, allows its one branch', () => {
    expect(codes(Scope.ofPushKey(all, 3))).toEqual(['CCC']);
    expect(codes(Scope.ofPushKey(all, 99))).toEqual([]);
  });
});

describe('Scope.narrow', () => {
  const office = Scope.ofGrant(all, grant('head_office'));

  it('given repeats of one filter, takes either; given both filters, what is in both (rule 22)', () => {
    expect(codes(office.narrow({ branch: ['AAA', 'DDD'] }))).toEqual(['AAA', 'DDD']);
    expect(codes(office.narrow({ region: ['COAST', 'HILLS'], branch: ['DDD'] }))).toEqual(['DDD']);
    expect(codes(office.narrow({ region: ['COAST'], branch: ['DDD'] }))).toEqual([]);
    expect(codes(office.narrow({}))).toEqual(codes(office));
    expect(codes(office.narrow({ branch: [] }))).toEqual([]);
  });

  it('given any filters on any grant, never holds a branch that the grant does not', () => {
    const code = fc.constantFrom('AAA', 'BBB', 'CCC', 'DDD', 'ZZZ', '', '%');
    const region = fc.constantFrom('COAST', 'HILLS', 'ZZZ');
    const asked = fc.record(
      { branch: fc.array(code), region: fc.array(region) },
      { requiredKeys: [] },
    );
    fc.assert(
      fc.property(fc.subarray([1, 2, 3, 4]), fc.array(asked), (ids, steps) => {
        const allowed = Scope.ofGrant(all, grant('site_manager', ids));
        const narrowed = steps.reduce((scope, step) => scope.narrow(step), allowed);
        expect(codes(allowed)).toEqual(expect.arrayContaining(codes(narrowed)));
      }),
    );
  });
});

describe('Scope', () => {
  const coast = Scope.ofGrant(all, grant('regional_lead', [], ['COAST']));

  it('given a code inside or outside, finds the one and not the other', () => {
    expect(coast.branch('AAA')?.id).toBe(2);
    expect(coast.branch('DDD')).toBeUndefined();
    expect(coast.branch('aaa')).toBeUndefined();
  });

  it('given an answer to write, echoes branches and their regions, sorted', () => {
    expect(coast.echo()).toEqual({ regions: ['COAST'], branches: ['AAA', 'BBB'] });
    expect(Scope.nothing.echo()).toEqual({ regions: [], branches: [] });
  });

  it('given a thread to cross, comes out the same after a structured clone', () => {
    const there = Scope.unpack(structuredClone(coast.pack()));
    expect(there.branches).toEqual(coast.branches);
    expect(there.idsJson).toBe('[2,4]');
    expect(there.narrow({ branch: ['AAA', 'DDD'] }).echo().branches).toEqual(['AAA']);
  });
});

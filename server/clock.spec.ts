import { Scope, type ScopedBranch } from '#db/scope';
import { fixedClock, todayIn } from './clock';

const branch = (id: number, timeZone: string): ScopedBranch => ({
  id,
  code: `B${id}`,
  name: 'x',
  region: 'R1',
  timeZone,
});
const all = [
  branch(1, 'Pacific/Pago_Pago'),
  branch(2, 'Europe/Berlin'),
  branch(3, 'Pacific/Kiritimati'),
];
const scope = (...branchIds: number[]): Scope =>
  Scope.ofGrant(all, { role: 'site_manager', branchIds, regionCodes: [] });
/** In Pago Pago still the first of February, in Berlin and on Kiritimati the second. */
const clock = fixedClock(new Date('2026-02-02T00:30:00Z'));

describe('todayIn', () => {
  it('given several branches, is the latest local date among them (rule 9)', () => {
    expect(todayIn(scope(1), clock)).toBe('2026-02-01');
    expect(todayIn(scope(1, 2), clock)).toBe('2026-02-02');
    const noon = fixedClock(new Date('2026-02-02T12:00:00Z'));
    expect(todayIn(scope(1, 2), noon)).toBe('2026-02-02');
    expect(todayIn(scope(1, 2, 3), noon)).toBe('2026-02-03');
  });

  it('given no branch, is the date in UTC', () => {
    expect(todayIn(Scope.nothing, clock)).toBe('2026-02-02');
    expect(todayIn(Scope.nothing, fixedClock(new Date('2026-02-01T23:59:59Z')))).toBe('2026-02-01');
  });
});

describe('fixedClock', () => {
  it('given a caller who changes what they were handed, stands still', () => {
    clock.now().setFullYear(1999);
    expect(clock.now().toISOString()).toBe('2026-02-02T00:30:00.000Z');
  });
});

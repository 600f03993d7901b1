import type { Person } from '#db/queries/people';
import { Scope } from '#db/scope';
import { todayIn } from '../clock';
import type { Digest } from '../features/digests/digest';
import type { DueDigest } from '../features/digests/due-digests';
import { monthDigest } from '../features/digests/month-digest';
import { regionDigest } from '../features/digests/region-digest';
import { weekDigest, type WeekFigures } from '../features/digests/week-digest';
import type { Kit } from '../kit';

/** What digests are made with. */
export type DigestTools = Pick<Kit, 'store' | 'clock' | 'reads'>;

/** What a person is told, read through their own scope and no further; nothing where there is nothing to say. */
export async function makeDigest(
  { store, clock, reads }: DigestTools,
  due: DueDigest,
  person: Person,
): Promise<Digest | undefined> {
  const scope = scopeOf(store.state.branches, person);
  const today = todayIn(scope, clock);
  switch (due.kind) {
    case 'monday_digest': {
      const weeks: WeekFigures[] = [];
      for (const { code } of scope.branches) {
        const branch = scope.narrow({ branch: [code] });
        weeks.push(await reads.answer('digestWeek', branch, { week: due.period, today }));
      }
      return weekDigest(weeks);
    }
    case 'region_digest':
      return regionDigest(await reads.answer('digestChanges', scope, asked(due, today)));
    case 'month_digest':
      return monthDigest(await reads.answer('digestMonth', scope, asked(due, today)));
  }
}

function asked({ days, carsOf }: Exclude<DueDigest, { kind: 'monday_digest' }>, today: string) {
  return { days, carsOf, today };
}

function scopeOf(branches: Parameters<typeof Scope.ofGrant>[0], person: Person): Scope {
  return Scope.ofGrant(branches, {
    role: person.role,
    branchIds: branches.filter(({ code }) => person.branches.includes(code)).map(({ id }) => id),
    regionCodes: person.regions,
  });
}

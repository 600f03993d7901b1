import { scopedFunnelSource } from '#db/queries/branches';
import { readCoverByBranch, readCoveredClaims } from '#db/queries/warranty';
import type { ScopedDb } from '#db/scoped-db';
import { claimStanding } from '#shared/domain/claim-standing';
import { whereJobs, type JobFilters } from '#db/queries/job-filters';
import { warrantyEnd } from '#shared/domain/warranty-cover';

/** A stretch of days, both ends included. */
interface Days {
  from: string;
  to: string;
}

/** Counted claims made in each stretch, and cars under warranty on a day of it that has come, whenever they were finished. */
export interface ClaimsOfDays {
  claims: number[];
  cars: number[];
}

/** By branch id; `today` is the day as of which claims count (rule 14). */
export function claimsByDays(
  db: ScopedDb,
  filters: Omit<JobFilters, 'from' | 'to'>,
  stretches: readonly Days[],
  today: string,
): Map<number, ClaimsOfDays> {
  const source = scopedFunnelSource(db);
  const branches = new Map<number, ClaimsOfDays>();
  const ofBranch = (id: number): ClaimsOfDays => {
    let own = branches.get(id);
    if (!own) {
      own = { claims: stretches.map(() => 0), cars: stretches.map(() => 0) };
      branches.set(id, own);
    }
    return own;
  };
  const ends = new Map<string, string>();
  const endOf = (completedOn: string, months: number): string => {
    const name = `${completedOn}/${months}`;
    let end = ends.get(name);
    if (end === undefined) ends.set(name, (end = warrantyEnd(completedOn, months)));
    return end;
  };
  const firsts = new Map<string, number>();
  const firstOf = (completedOn: string): number => {
    let first = firsts.get(completedOn);
    if (first === undefined) {
      firsts.set(completedOn, (first = stretches.findIndex(({ to }) => completedOn <= to)));
    }
    return first;
  };
  for (const cars of readCoverByBranch(source, whereJobs(source.facts(), filters))) {
    const { cars: counts } = ofBranch(cars.branchId);
    cars.completedOn.forEach((completedOn, car) => {
      const months = cars.warrantyMonths[car] as number;
      if (months === 0) return;
      const end = endOf(completedOn, months);
      // Stretches follow one another: those under cover are a run of them.
      const first = firstOf(completedOn);
      if (first < 0) return;
      for (let place = first; place < stretches.length; place += 1) {
        const { from } = stretches[place] as Days;
        if (end < from || today < from) break;
        counts[place] = (counts[place] as number) + 1;
      }
    });
  }
  const made = readCoveredClaims(
    source,
    whereJobs(source.facts(), filters),
    today,
    source.claims(),
  );
  for (const claim of made) {
    const { completedOn, warrantyMonths, madeOn, branchId } = claim;
    const end = warrantyMonths === 0 ? undefined : endOf(completedOn, warrantyMonths);
    if (claimStanding(claim, end, today) !== 'counted') continue;
    const place = stretches.findIndex(({ from, to }) => from <= madeOn && madeOn <= to);
    const { claims } = ofBranch(branchId);
    if (place >= 0) claims[place] = (claims[place] as number) + 1;
  }
  return branches;
}

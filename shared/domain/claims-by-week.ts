import { claimStanding, type StandingClaim } from './claim-standing';
import type { Period } from './period';
import { warrantyEnd, type CoverBook } from './warranty-cover';

/** A claim of a branch with what its car's cover is known by. */
export interface ClaimOnCar extends StandingClaim {
  branchId: number;
  completedOn: string;
  warrantyMonths: number;
}

/** Those of some claims that count as of a day (rule 14), in their order. */
export function countedClaims<Claim extends ClaimOnCar>(
  claims: readonly Claim[],
  book: CoverBook,
  today: string,
): Claim[] {
  return claims.filter((claim) => {
    const end = book.coverOf(claim.completedOn, claim.warrantyMonths)?.end;
    return claimStanding(claim, end, today) === 'counted';
  });
}

/** Claims by the stretch of days they were made in, branch by branch; stretches lie one after another. */
export function claimsByStretch<Claim extends ClaimOnCar>(
  claims: readonly Claim[],
  stretches: readonly Period[],
): Map<number, Claim[][]> {
  const branches = new Map<number, Claim[][]>();
  for (const claim of claims) {
    const place = stretches.findIndex(({ from, to }) => from <= claim.madeOn && claim.madeOn <= to);
    if (place < 0) continue;
    let own = branches.get(claim.branchId);
    if (!own) branches.set(claim.branchId, (own = stretches.map(() => [])));
    own[place]!.push(claim);
  }
  return branches;
}

/** How many cars are under warranty on a day of each stretch that has come by `today`, whenever they were finished. */
export function carsUnderCover(
  cars: { completedOn: readonly string[]; warrantyMonths: readonly number[] },
  stretches: readonly Period[],
  today: string,
): number[] {
  const begun = stretches.filter(({ from }) => from <= today).length;
  const places = new Map<string, { first: number; after: number }>();
  const placesOf = (completedOn: string, months: number): { first: number; after: number } => {
    const name = `${completedOn}/${months}`;
    let found = places.get(name);
    if (!found) {
      const end = warrantyEnd(completedOn, months);
      const first = stretches.findIndex(({ to }) => completedOn <= to);
      const later = stretches.findIndex(({ from }) => end < from);
      const after = Math.min(begun, later < 0 ? stretches.length : later);
      places.set(name, (found = { first: first < 0 ? after : first, after }));
    }
    return found;
  };
  // Those under cover are a run of stretches: its ends are counted, and then what lies between them.
  const steps = new Int32Array(stretches.length + 1);
  cars.completedOn.forEach((completedOn, car) => {
    const months = cars.warrantyMonths[car]!;
    if (months === 0) return;
    const { first, after } = placesOf(completedOn, months);
    if (first >= after) return;
    steps[first]! += 1;
    steps[after]! -= 1;
  });
  let under = 0;
  return stretches.map((_, place) => (under += steps[place]!));
}

import { readReceivedThrough } from '#db/queries/received-through';
import { readTargets } from '#db/queries/targets';
import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { BranchesAnswer, BranchReceived } from '#shared/contracts/branches';
import type { FunnelPlace } from '#shared/domain/funnel';
import { placeBranches, type BranchesQuestion } from './place-branches';

/** Branches in the funnel of a measure (rules 42 to 44); one snapshot of the database. */
export function answerBranches(
  db: ScopedDb,
  question: BranchesQuestion,
  reference: NetworkReference,
): BranchesAnswer {
  return db.snapshot(() => {
    const { measure, period } = question;
    const placed = placeBranches(db, reference, question);
    const targets = readTargets(db);
    return {
      period,
      scope: db.scope.echo(),
      jobs: placed.jobs,
      measure,
      reference: placed.kind,
      network: placed.reference.value ?? null,
      referenceCars: placed.reference.cars,
      ...placed.money,
      branches: placed.places.map(({ branch, place, claims }) => ({
        branch: branch.code,
        region: branch.region,
        ...tellPlace(place),
        denominator: measure === 'claims' ? place.e * 1000 : place.e,
        claims: measure === 'claims' ? claims : null,
        expectedClaims:
          measure === 'claims' && place.expected !== undefined ? place.expected * place.e : null,
        target: targets.branch(branch.id, measure),
      })),
      received: receivedOf(db),
    };
  });
}

/** A place as answers tell it. */
export function tellPlace({
  cars,
  value,
  expected,
  limits,
  flag,
}: FunnelPlace): Pick<
  BranchesAnswer['branches'][number],
  'cars' | 'value' | 'expected' | 'lower95' | 'upper95' | 'lower998' | 'upper998' | 'flag'
> {
  return {
    cars,
    value: value ?? null,
    expected: expected ?? null,
    lower95: limits?.lower95 ?? null,
    upper95: limits?.upper95 ?? null,
    lower998: limits?.lower998 ?? null,
    upper998: limits?.upper998 ?? null,
    flag,
  };
}

/** Every branch in scope, whether it has sent anything or not. */
function receivedOf(db: ScopedDb): BranchReceived[] {
  const known = new Map(readReceivedThrough(db).map((one) => [one.branchId, one]));
  return db.scope.branches.map(({ id, code, region }) => ({
    branch: code,
    region,
    receivedThrough: known.get(id)?.receivedThrough ?? null,
    lastReceivedAt: known.get(id)?.lastReceivedAt ?? null,
  }));
}

import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { SideBySideAnswer } from '#shared/contracts/branches';
import { stepsOf } from '#shared/domain/funnel';
import { tellPlace } from './answer-branches';
import { placeBranches, type BranchesQuestion } from './place-branches';

/** What sets the branches asked for apart from the reference, in steps that add up; one snapshot of the database. */
export function answerSideBySide(
  db: ScopedDb,
  question: BranchesQuestion,
  reference: NetworkReference,
): SideBySideAnswer {
  return db.snapshot(() => {
    const { measure, period } = question;
    const placed = placeBranches(db, reference, question, 'apart');
    return {
      period,
      scope: db.scope.echo(),
      jobs: placed.jobs,
      measure,
      reference: placed.kind,
      network: placed.reference.value ?? null,
      ...placed.money,
      branches: placed.places.map(({ branch, place }) => {
        const { cars, value, expected, flag } = tellPlace(place);
        const steps = stepsOf(place, placed.reference, placed.parts);
        return {
          branch: branch.code,
          region: branch.region,
          cars,
          value,
          expected,
          flag,
          // Revenue is the same share of itself everywhere.
          steps: steps?.filter(({ key }) => measure !== 'margin' || key !== 'revenue') ?? null,
        };
      }),
    };
  });
}

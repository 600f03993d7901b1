import { readTargets } from '#db/queries/targets';
import { setNetworkTarget, TargetWriter } from '#db/target-writer';
import type { ScopedBranch } from '#db/scope';
import * as contract from '#shared/contracts/targets';
import { refuseInput } from '#shared/domain/refusal';
import {
  breaksOfTarget,
  TARGET_MEASURES,
  type TargetMeasure,
} from '#shared/domain/target-measures';
import { deedOf } from '../../http/deed';
import { mount, namedBranch, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** What the network and its branches want to reach: a line beside the figures, never a limit. */
export function mountTargets(mounting: Mounting, kit: Kit): void {
  const { store } = kit;

  mount(mounting, contract.listTargets, (call) => {
    const targets = readTargets(store.scoped(call.scope));
    return {
      body: {
        network: TARGET_MEASURES.map((measure) => ({
          measure,
          value: targets.network.get(measure) ?? null,
        })),
        branches: call.scope.branches.flatMap((branch) =>
          TARGET_MEASURES.map((measure) => tell(targets, branch, measure)),
        ),
      },
    };
  });

  mount(mounting, contract.putNetworkTarget, async (call) => {
    const { measure } = call.params;
    const { value } = call.body;
    check(measure, value);
    const deed = deedOf(call, `/targets/${measure}`);
    await store.queue.write(() => setNetworkTarget(store, measure, value, deed));
    return { body: { measure, value } };
  });

  mount(mounting, contract.putBranchTarget, async (call) => {
    const { measure } = call.params;
    const { value } = call.body;
    check(measure, value);
    const branch = namedBranch(call);
    const deed = deedOf(call, `/branches/${branch.code}/targets/${measure}`);
    const writer = new TargetWriter(store, branch);
    const targets = await store.queue.write(() => writer.set(measure, value, deed));
    return { body: tell(targets, branch, measure) };
  });
}

function check(measure: TargetMeasure, value: number | null): void {
  const problems = breaksOfTarget(measure, value);
  if (problems.length > 0) throw refuseInput(problems);
}

function tell(
  targets: ReturnType<typeof readTargets>,
  { id, code }: ScopedBranch,
  measure: TargetMeasure,
): contract.BranchTarget {
  return {
    branch: code,
    measure,
    own: targets.own(id, measure),
    holds: targets.branch(id, measure),
  };
}

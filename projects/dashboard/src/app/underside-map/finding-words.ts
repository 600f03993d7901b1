import { CONDITIONS, type Condition } from '#shared/domain/vocabulary';
import { ACTION_NAMES, CONDITION_NAMES } from '../ui/words';
import type { Look } from './share-scale';
import type { UndersideFinding } from './underside-input';

type Rust = Pick<UndersideFinding, 'seenAs' | 'workedAs'>;

/** The graver of the two conditions a finding has been given. */
export function graverOf({ seenAs, workedAs }: Rust): Condition {
  if (!workedAs) return seenAs;
  return CONDITIONS.indexOf(workedAs) > CONDITIONS.indexOf(seenAs) ? workedAs : seenAs;
}

/** How the zone of a finding is filled: the graver, the darker. */
export function lookOfCondition(condition: Condition): Look {
  const looks = { surface: 'step-1', bubbling: 'step-2', holed: 'step-3' } as const;
  return looks[condition];
}

/** What became of a finding, after its place: "seen as bubbling, worked as holed, patched". */
export function findingWords({ seenAs, workedAs, action }: UndersideFinding): string {
  return [
    `seen as ${CONDITION_NAMES[seenAs]}`,
    workedAs ? `worked as ${CONDITION_NAMES[workedAs]}` : '',
    action ? ACTION_NAMES[action] : '',
  ]
    .filter((words) => words !== '')
    .join(', ');
}

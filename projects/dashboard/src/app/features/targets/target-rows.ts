import type { listTargets } from '#shared/contracts/targets';
import type { OutOf } from '#shared/contracts/endpoint';
import { TARGET_MEASURES, type TargetMeasure } from '#shared/domain/target-measures';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount } from '../../ui/format';
import { formatTarget, MEASURE_NAMES } from '../../ui/measure-words';

type Targets = OutOf<typeof listTargets>;

/** One target of the network or of a branch, as a cell says it. */
export interface TargetCellView {
  readonly key: string;
  readonly measure: TargetMeasure;
  /** `null`: the network's. */
  readonly branch: string | null;
  /** What stands there itself; null where none is set. */
  readonly own: number | null;
  /** What holds: "35 %", "none". */
  readonly holds: string;
  /** Whose it is, where it is not the cell's own: "the network’s". */
  readonly whose: string;
  /** For those who hear it: "Margin target of Havnsund". */
  readonly name: string;
}

/** The network, or a branch, with its targets. */
export interface TargetRow {
  readonly key: string;
  readonly name: string;
  readonly cells: readonly TargetCellView[];
}

/** Turns the answer into rows: the network first, then the branches in the order of their names. */
export function targetRows(targets: Targets, branchName: (code: string) => string): TargetRow[] {
  const codes = [...new Set(targets.branches.map(({ branch }) => branch))];
  const branches = codes
    .map((code) => ({
      key: code,
      name: branchName(code),
      cells: TARGET_MEASURES.map((measure) => branchCell(targets, code, measure, branchName(code))),
    }))
    .sort((a, b) => a.name.localeCompare(b.name, 'en'));
  const network: TargetRow = {
    key: 'network',
    name: 'The network',
    cells: TARGET_MEASURES.map((measure) => {
      const own = targets.network.find((one) => one.measure === measure)?.value ?? null;
      return {
        key: `network/${measure}`,
        measure,
        branch: null,
        own,
        holds: own === null ? 'none' : formatTarget(measure, own),
        whose: '',
        name: cellName(measure, 'the network'),
      };
    }),
  };
  return [network, ...branches];
}

/** How many branches follow the network and how many have targets of their own. */
export function answerTargets(targets: Targets): {
  sentence: readonly AnswerPart[];
  second: readonly AnswerPart[];
} {
  const set = targets.network.filter(({ value }) => value !== null).length;
  const own = new Set(
    targets.branches.filter((one) => one.own !== null).map(({ branch }) => branch),
  );
  const second = [
    'A target is what is wanted. The limits on the weekly chart and in the funnel are what the work has been; a target stands beside them and never moves them.',
  ];
  if (set === 0 && own.size === 0) return { sentence: ['No target is set.'], second };
  return {
    sentence: [
      { figure: formatCount(set) },
      ` of ${TARGET_MEASURES.length} figures ${set === 1 ? 'has' : 'have'} a target for the network`,
      own.size === 0
        ? '; every branch follows it.'
        : own.size === 1
          ? '; one branch has its own.'
          : `; ${formatCount(own.size)} branches have their own.`,
    ],
    second,
  };
}

function branchCell(
  targets: Targets,
  code: string,
  measure: TargetMeasure,
  name: string,
): TargetCellView {
  const found = targets.branches.find((one) => one.branch === code && one.measure === measure);
  const holds = found?.holds ?? null;
  const own = found?.own ?? null;
  return {
    key: `${code}/${measure}`,
    measure,
    branch: code,
    own,
    holds: holds === null ? 'none' : formatTarget(measure, holds),
    whose: holds === null || own !== null ? '' : 'the network’s',
    name: cellName(measure, name),
  };
}

function cellName(measure: TargetMeasure, of: string): string {
  const word = MEASURE_NAMES[measure];
  return `${word.charAt(0).toUpperCase()}${word.slice(1)} target of ${of}`;
}

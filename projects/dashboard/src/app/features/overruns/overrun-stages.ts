import type { OverrunAnswer, OverrunGroup } from '#shared/contracts/overrun';
import type { BridgeInput, BridgeRow } from '../../charts/bridge/bridge-input';
import type { DotIntervalInput } from '../../charts/dot-interval/dot-interval-input';
import type { Column } from '../../ui/data-table/column';
import { formatCars, formatCount } from '../../ui/format';
import { intervalRow, RATIO_MARKS } from './interval-rows';
import { overOf } from './overrun-answer';
import { groupColumns } from './overrun-table';
import {
  groupName,
  intervalText,
  noFigureText,
  type OverrunWords,
  ratioText,
} from './overrun-words';

/** The first picture: each stage's ratio, and the minutes over that add up to the total. */
export interface StagePictures {
  readonly ratios: DotIntervalInput;
  readonly ratiosNote: string;
  readonly columns: readonly Column<OverrunGroup>[];
  readonly rows: readonly OverrunGroup[];
  readonly minutes: BridgeInput;
  readonly minutesNote: string;
  readonly minutesColumns: readonly Column<BridgeRow>[];
}

/** Turns the answer by stage into its two pictures. */
export function stagePictures(answer: OverrunAnswer, words: OverrunWords): StagePictures {
  const { groups } = answer;
  return {
    ratios: {
      summary: summariseRatios(answer, words),
      rows: groups.map((stage) =>
        intervalRow(stage, groupName('stage', stage.key, words), { reference: 1, chosen: false }),
      ),
      scale: 'log',
      reference: 1,
      marks: RATIO_MARKS,
    },
    ratiosNote:
      'Worked against estimated time, dot and 95 % interval; shape and word where it misses',
    columns: groupColumns('stage', answer, words),
    rows: groups,
    minutes: { summary: summariseMinutes(answer, words), rows: minuteRows(answer, words) },
    minutesNote: `Minutes of ${formatCars(answer.overall.cars)}; the steps add up`,
    minutesColumns: [
      { key: 'label', label: 'Stage', text: ({ label }) => label, strong: ({ strong }) => strong },
      {
        key: 'minutes',
        label: 'Minutes',
        kind: 'number',
        text: ({ text }) => text,
        strong: ({ strong }) => strong,
      },
    ],
  };
}

function minuteRows({ overall, groups }: OverrunAnswer, words: OverrunWords): BridgeRow[] {
  const most = Math.max(...groups.map(overOf));
  return [
    total('expected', 'Estimated', overall.estimatedMinutes),
    ...groups.map((stage): BridgeRow => {
      const over = overOf(stage);
      return {
        key: stage.key,
        label: groupName('stage', stage.key, words),
        kind: 'step',
        value: over,
        text: over > 0 ? `+${formatCount(over)}` : formatCount(over),
        // Time over the estimate is a loss, time won back a gain.
        role: over > 0 ? 'loss' : 'gain',
        strong: over > 0 && over === most,
      };
    }),
    total('kept', 'Worked', overall.actualMinutes),
  ];
}

function total(role: 'expected' | 'kept', label: string, minutes: number): BridgeRow {
  return {
    key: role,
    label,
    kind: 'total',
    value: minutes,
    text: formatCount(minutes),
    role,
    strong: true,
  };
}

function summariseRatios({ groups }: OverrunAnswer, words: OverrunWords): string {
  const said = groups.map((stage) => {
    const name = groupName('stage', stage.key, words);
    if (stage.ratio === null) return `${name} ${noFigureText(stage.estimatedMinutes, stage.cars)}`;
    const interval =
      stage.ratioStandardError === null
        ? ''
        : ` (${intervalText(stage.ratio, stage.ratioStandardError)})`;
    return `${name} ${ratioText(stage.ratio)}${interval}`;
  });
  return `Time over the estimate by stage: ${said.join('; ')}.`;
}

function summariseMinutes({ overall, groups }: OverrunAnswer, words: OverrunWords): string {
  const steps = groups.map(
    (stage) => `${groupName('stage', stage.key, words)} ${formatCount(overOf(stage))}`,
  );
  return `${formatCount(overall.estimatedMinutes)} minutes estimated, ${formatCount(overall.actualMinutes)} worked. Over by stage: ${steps.join(', ')}.`;
}

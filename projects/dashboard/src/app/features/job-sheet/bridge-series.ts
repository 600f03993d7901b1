import type { JobSheet } from '#shared/contracts/jobs';
import type { BridgeInput, BridgeRow } from '../../charts/bridge/bridge-input';
import type { Column } from '../../ui/data-table/column';
import { formatExactAmount, formatSignedExactAmount } from '../../ui/format';

type JobMoney = NonNullable<JobSheet['money']>;
type JobBridge = NonNullable<JobMoney['bridge']>;

const STEPS = [
  ['priceCents', 'Price'],
  ['plannedLabourCents', 'Planned labour'],
  ['rotLabourCents', 'Rot labour'],
  ['productCents', 'Product'],
  ['consumablesCents', 'Consumables, bought-in'],
  ['feeCents', 'Fee'],
] as const satisfies readonly (readonly [keyof JobBridge, string])[];

/** The same steps as a table. */
export const BRIDGE_COLUMNS: readonly Column<BridgeRow>[] = [
  { key: 'label', label: 'Step', text: ({ label }) => label, strong: ({ strong }) => strong },
  {
    key: 'amount',
    label: 'Effect on margin',
    kind: 'number',
    text: ({ text }) => text,
    strong: ({ strong }) => strong,
  },
];

/** The step that moved the margin most, either way; `undefined` when none moved it. */
export function largestStep(
  bridge: JobBridge,
): { readonly name: string; readonly cents: number } | undefined {
  const [largest] = STEPS.map(([key, name]) => ({ name, cents: bridge[key] })).sort(
    (a, b) => Math.abs(b.cents) - Math.abs(a.cents),
  );
  return largest && largest.cents !== 0 ? largest : undefined;
}

/** A job's bridge as the chart takes it, in minor units. */
export function bridgeSeries(bridge: JobBridge): BridgeInput {
  const largest = largestStep(bridge);
  const steps = STEPS.map(([key, label]): BridgeRow => {
    const value = bridge[key];
    return {
      key,
      label,
      kind: 'step',
      value,
      text: value === 0 ? formatExactAmount(0) : formatSignedExactAmount(value),
      role: value < 0 ? 'loss' : value > 0 ? 'gain' : 'neutral',
      strong: label === largest?.name,
    };
  });
  return {
    summary: bridgeWords(bridge),
    rows: [
      end('expected', 'Expected', bridge.expectedMarginCents),
      ...steps,
      end('kept', 'Kept', bridge.marginCents),
    ],
  };
}

/** The bridge's finding as a sentence. */
function bridgeWords(bridge: JobBridge): string {
  const largest = largestStep(bridge);
  const ends = `Expected ${formatExactAmount(bridge.expectedMarginCents)}, kept ${formatExactAmount(bridge.marginCents)}`;
  return largest
    ? `${ends}; the largest step is ${largest.name.toLocaleLowerCase()}, ${formatSignedExactAmount(largest.cents)}.`
    : `${ends}; no step changed it.`;
}

function end(role: 'expected' | 'kept', label: string, value: number): BridgeRow {
  return {
    key: role,
    label,
    kind: 'total',
    value,
    text: formatExactAmount(value),
    role,
    strong: true,
  };
}

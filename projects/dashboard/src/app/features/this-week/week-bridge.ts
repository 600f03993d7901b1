import { BRIDGE_STEPS, largestStep, type BridgeStep } from '#shared/domain/bridge';
import type { Bridge } from '#shared/contracts/margin';
import type { BridgeInput, BridgeRow } from '../../charts/bridge/bridge-input';
import type { Column } from '../../ui/data-table/column';
import {
  currencySign,
  formatCars,
  formatCount,
  formatExactAmount,
  formatExactMoney,
  formatMoney,
  formatSignedExactAmount,
} from '../../ui/format';
import { STEP_LABELS, STEP_WORDS } from './week-words';

/** The bridge of a week: what is drawn, its title, and the same steps as a table. */
export interface WeekBridge {
  readonly heading: string;
  readonly note: string;
  readonly input: BridgeInput;
  readonly columns: readonly Column<BridgeRow>[];
}

const COLUMNS: readonly Column<BridgeRow>[] = [
  { key: 'label', label: 'Step', text: ({ label }) => label, strong: ({ strong }) => strong },
  {
    key: 'amount',
    label: 'Effect on margin',
    kind: 'number',
    text: ({ text }) => text,
    strong: ({ strong }) => strong,
  },
];

/** Turns the week's bridge into rows that add up to the cent. `billed` is the number of billed cars it could have covered. */
export function weekBridge(bridge: Bridge, billed: number, currency: string): WeekBridge {
  const named = largestStep(bridge)?.step;
  const rows: BridgeRow[] = [
    total('expected', 'Expected', bridge.expectedMarginCents),
    ...BRIDGE_STEPS.map((step) => stepRow(step, bridge[`${step}Cents`], step === named)),
    total('kept', 'Kept', bridge.marginCents),
  ];
  const part = bridge.cars < billed;
  const sign = currencySign(currency);
  return {
    heading: `From expected to kept, ${part ? `${formatCount(bridge.cars)} of ${formatCars(billed)}` : formatCars(bridge.cars)}`,
    note: part
      ? `Each step is its effect on margin, ${sign}; cars without an estimate or a norm are left out`
      : `Each step is its effect on margin, ${sign}`,
    input: { summary: summarise(bridge, named, currency), rows },
    columns: COLUMNS,
  };
}

function total(role: 'expected' | 'kept', label: string, cents: number): BridgeRow {
  return {
    key: role,
    label,
    kind: 'total',
    value: cents,
    text: formatExactAmount(cents),
    role,
    strong: true,
  };
}

function stepRow(step: BridgeStep, cents: number, strong: boolean): BridgeRow {
  return {
    key: step,
    label: STEP_LABELS[step],
    kind: 'step',
    value: cents,
    text: formatSignedExactAmount(cents),
    role: cents < 0 ? 'loss' : 'gain',
    strong,
  };
}

function summarise(bridge: Bridge, named: BridgeStep | undefined, currency: string): string {
  const from = formatExactMoney(bridge.expectedMarginCents, currency);
  const to = formatExactMoney(bridge.marginCents, currency);
  const said = `${formatCars(bridge.cars)}: ${from} margin expected, ${to} kept.`;
  if (!named) return `${said} No step changed it.`;
  const cents = bridge[`${named}Cents`];
  const money = formatMoney(Math.abs(cents), currency);
  return `${said} The largest step: ${STEP_WORDS[named]}, which ${cents < 0 ? 'took' : 'added'} ${money}.`;
}

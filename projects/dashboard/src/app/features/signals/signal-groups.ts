import type { Signal } from '#shared/contracts/signals';
import { canHurt, signalRow, type SignalRow } from './signal-words';

/** Signals that stand under one heading. */
export interface SignalGroup {
  readonly key: string;
  readonly heading: string;
  readonly danger: boolean;
  readonly rows: readonly SignalRow[];
}

/** What can hurt somebody first, over all branches; then branch by branch, in the order of their names. */
export function groupSignals(
  signals: readonly Signal[],
  branchName: (code: string) => string,
): SignalGroup[] {
  const rows = signals.map((one) => signalRow(one, branchName(one.branch)));
  const urgent = ({ of }: SignalRow): boolean => canHurt(of) && of.state !== 'over';
  const danger = rows.filter(urgent);
  const byBranch = new Map<string, SignalRow[]>();
  for (const row of rows) {
    if (urgent(row)) continue;
    byBranch.set(row.of.branch, [...(byBranch.get(row.of.branch) ?? []), row]);
  }
  const branches = [...byBranch]
    .map(([key, ofBranch]) => ({
      key,
      heading: branchName(key),
      danger: false,
      rows: ofBranch,
    }))
    .sort((a, b) => a.heading.localeCompare(b.heading, 'en'));
  return danger.length === 0
    ? branches
    : [{ key: 'danger', heading: 'Can hurt somebody', danger: true, rows: danger }, ...branches];
}

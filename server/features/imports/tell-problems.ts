import type { PreviewRow } from '#shared/contracts/imports';
import type { FieldProblem } from '#shared/contracts/fields';
import type { ReadRow } from './read-row';
import type { RowBody } from './row-body';
import type { RowWorld } from './row-world';

export type ToldProblem = PreviewRow['problems'][number];

/** Everything that is wrong with a row, by the headings of its file and in words that a person can act on. */
export function tellProblems(
  row: ReadRow,
  draft: RowBody | undefined,
  found: readonly FieldProblem[],
  world: RowWorld,
): ToldProblem[] {
  const cells = row.problems;
  const unread = new Set(cells.map(({ fills }) => fills));
  const told = [...cells, ...(draft?.problems ?? [])].map(({ fills, message }) => ({
    heading: fills === null ? null : headingOf(fills, world),
    message,
  }));
  for (const { path, message } of found) {
    const fills = placeOf(path, draft);
    // Of a cell that could not be read, that is what is said.
    if (fills !== undefined && unread.has(fills)) continue;
    told.push(tellOne(path, fills, message, world));
  }
  return withoutRepeats(told);
}

/** A problem that is told of the row as a whole or of the column of its reference. */
export function tellOfReference(message: string, world: RowWorld): ToldProblem {
  return { heading: headingOf(refField(world), world), message };
}

/** The field by which a row is known. */
export function refField({ kind }: Pick<RowWorld, 'kind'>): 'jobRef' | 'claimRef' {
  return kind === 'jobs' ? 'jobRef' : 'claimRef';
}

function placeOf(path: string, draft: RowBody | undefined): string | undefined {
  return draft?.places.get(path) ?? (/^\/\w+$/.test(path) ? path.slice(1) : undefined);
}

function tellOne(
  path: string,
  fills: string | undefined,
  message: string,
  world: RowWorld,
): ToldProblem {
  const heading = fills === undefined ? null : headingOf(fills, world);
  const label = labelOf(path, fills, world);
  if (message.startsWith('is required')) {
    return heading === null
      ? { heading, message: `"${label}" is needed, and no column of this file fills it` }
      : { heading, message: 'is empty, but needed' };
  }
  const words = inFileWords(message, fills, world);
  return { heading, message: heading === null && label !== '' ? `"${label}" ${words}` : words };
}

function headingOf(fills: string, { columns }: RowWorld): string | null {
  return columns.find(({ field }) => field.fills === fills)?.heading ?? null;
}

const PARTS: Record<string, string> = {
  '/actual': 'Minutes worked',
  '/estimate/stages': 'Estimated minutes',
  '/findings': '',
};

function labelOf(path: string, fills: string | undefined, { fields }: RowWorld): string {
  const part = PARTS[path];
  if (part !== undefined) return part;
  const field = fields.find((one) => one.fills === fills);
  return field?.label ?? path.slice(1).replaceAll('/', ' ');
}

/** Names of JSON fields become headings, and limits of amounts are said as amounts are written. */
function inFileWords(message: string, fills: string | undefined, world: RowWorld): string {
  const { columns, fields } = world;
  const column = columns.find(({ field }) => field.fills === fills);
  const named = message.replace(
    /\b(bookedOn|startedOn|completedOn|madeOn|decidedOn|paidOn)\b/g,
    (name) =>
      `"${headingOf(name, world) ?? fields.find(({ field }) => field === name)?.label ?? name}"`,
  );
  if (column?.field.kind !== 'amount') return named;
  return named.replace(/\d{3,}$/, (cents) => `${cents.slice(0, -2)}.${cents.slice(-2)}`);
}

/** The same sentence is told once of a column, and not again of the row as a whole. */
function withoutRepeats(told: readonly ToldProblem[]): ToldProblem[] {
  const kept: ToldProblem[] = [];
  for (const problem of told) {
    const said = kept.some(
      ({ heading, message }) =>
        message === problem.message && (heading === problem.heading || problem.heading === null),
    );
    if (!said) kept.push(problem);
  }
  return kept;
}

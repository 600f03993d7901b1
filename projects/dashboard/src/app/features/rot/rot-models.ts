import type { RotAnswer, RotModel } from '#shared/contracts/rot';
import type { AgeBand } from '#shared/domain/vocabulary';
import type { ShareCellInput } from '../../charts/share-cell/share-cell';
import type { CellLink, Column } from '../../ui/data-table/column';
import { formatCount, formatShare, formatShareRange } from '../../ui/format';
import { bandOf } from './age-choice';
import { agedWords, shareText } from './rot-words';

/** Rows before "Show all". */
export const FIRST_MODELS = 12;

/** The models of one age with everything the table says of them. */
export interface ModelsView {
  readonly heading: string;
  readonly rows: readonly RotModel[];
  readonly columns: readonly Column<RotModel>[];
  /** Share at the right end of the small pictures. */
  readonly end: number;
  readonly all: number | null;
  /** Said where the models do not differ more than chance. */
  readonly pooled: string | null;
}

/** Turns the models of an age into the table's input. `linkOf` leads to the cars with rot of a model. */
export function modelsView(
  answer: RotAnswer,
  age: AgeBand,
  linkOf: (model: RotModel) => CellLink | undefined,
): ModelsView {
  const rows = answer.models
    .filter(({ ageBand }) => ageBand === age)
    .sort((a, b) => b.shrunkShare - a.shrunkShare || b.cars - a.cars);
  const all = bandOf(answer, age).share;
  const end = axisEnd(rows);
  return {
    heading: `Models, aged ${agedWords(age)}`,
    rows,
    columns: columnsOf(end, linkOf),
    end,
    all,
    pooled: pooledWords(rows),
  };
}

const ON_A_PHONE = ['model', 'steadied', 'range', 'cars'];

/** The columns with what matters most first: on a phone the rest is reached by scrolling sideways. */
export function narrowOrder<Row>(columns: readonly Column<Row>[]): readonly Column<Row>[] {
  const rank = ({ key }: Column<Row>): number => ON_A_PHONE.indexOf(key) + 1 || Infinity;
  return [...columns].sort((a, b) => (rank(a) === rank(b) ? 0 : rank(a) - rank(b)));
}

/** What the small picture of a row draws. */
export function shareCell(model: RotModel, all: number | null): ShareCellInput {
  const { share, shrunkShare, lower, upper } = model;
  return { counted: share, steadied: shrunkShare, lower, upper, all };
}

/** A whole tenth that holds every interval. */
function axisEnd(rows: readonly RotModel[]): number {
  const reach = Math.max(0.1, ...rows.flatMap(({ upper, share }) => [upper, share ?? 0]));
  return Math.min(1, Math.ceil(reach * 10 - 1e-9) / 10);
}

function pooledWords(rows: readonly RotModel[]): string | null {
  if (rows.length === 0 || !rows.every(({ pooled }) => pooled)) return null;
  return rows.length === 1
    ? 'One model only: there is nothing to steady it toward.'
    : 'These models differ no more than chance alone would make them, so each is given the share of all.';
}

function columnsOf(
  end: number,
  link: (model: RotModel) => CellLink | undefined,
): readonly Column<RotModel>[] {
  return [
    {
      key: 'model',
      label: 'Model',
      text: ({ make, model }) => `${make} ${model}`,
      sortBy: ({ make, model }) => `${make} ${model}`,
      link,
    },
    count('cars', 'Cars', ({ cars }) => cars),
    count('rot', 'Rot', ({ withRot }) => withRot),
    {
      key: 'counted',
      label: 'As counted',
      kind: 'number',
      text: shareText,
      muted: ({ share }) => share === null,
      sortBy: ({ share }) => share,
    },
    {
      key: 'steadied',
      label: 'Steadied',
      kind: 'number',
      strong: true,
      text: ({ shrunkShare }) => formatShare(shrunkShare),
      sortBy: ({ shrunkShare }) => shrunkShare,
    },
    {
      key: 'range',
      label: '95\u202f%',
      kind: 'number',
      muted: () => true,
      text: ({ lower, upper }) => formatShareRange(lower, upper),
    },
    {
      key: 'picture',
      label: 'As a picture',
      text: () => '',
      ends: ['0', formatShare(end)],
    },
  ];
}

function count(key: string, label: string, of: (model: RotModel) => number): Column<RotModel> {
  return { key, label, kind: 'number', text: (model) => formatCount(of(model)), sortBy: of };
}

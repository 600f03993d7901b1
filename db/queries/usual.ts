import type { Knex } from 'knex';
import { STAGES, type ConsumableKind, type Stage } from '#shared/domain/vocabulary';
import { ascending, quantile } from '#shared/stats/quantile';
import { sql } from '../database';
import {
  carsOnRung,
  withProductLines,
  type QuotedCar,
  type QuoteRung,
  type QuoteSource,
} from './quote';

/** Where the middle of some cars lies and where nearly all of them do: quantiles at 2.5, 50 and 97.5 %. */
export interface UsualRange {
  low: number;
  usual: number;
  high: number;
}

/** What stands behind one figure of a set. */
export interface FigureBehind {
  cars: number;
  /** Branches besides the one asked for. */
  others: number;
}

/** Which figures may be told, by what stands behind them. */
export type MayTell = (behind: FigureBehind) => boolean;

/** What the cars of a set usually take; a figure that may not be told is `undefined`. */
export interface UsualFigures {
  cars: number;
  total: UsualRange | undefined;
  stages: { stage: Stage; range: UsualRange | undefined }[];
  products: { product: string; range: UsualRange | undefined }[];
  consumables: { kind: ConsumableKind; range: UsualRange | undefined }[];
}

/** One figure's values over the cars that have it, as a list. */
interface Listed {
  list: string;
  others: number;
}

/** The figures of the cars of a rung; `undefined` when it has none. Quantiles only, no car of it. */
export function readUsualFigures(
  source: QuoteSource,
  branchId: number,
  car: QuotedCar,
  rung: QuoteRung,
  mayTell: MayTell,
): UsualFigures | undefined {
  const rangeOf = ({ list, others }: Listed): UsualRange | undefined => {
    const values = ascending(JSON.parse(list) as number[]);
    if (!mayTell({ cars: values.length, others })) return undefined;
    const at = (p: number): number => quantile(values, p) ?? 0;
    return { low: at(0.025), usual: at(0.5), high: at(0.975) };
  };
  const cars = (): Knex.QueryBuilder => carsOnRung(source, car, rung);
  const minutes = readMinutes(source, branchId, cars());
  const products = readListed(source, branchId, productsOf(source, cars()));
  const consumables = readListed(source, branchId, consumablesOf(source, cars()));
  const count = (JSON.parse(minutes[0]?.list ?? '[]') as number[]).length;
  if (count === 0) return undefined;
  const [total, ...stages] = minutes.map(rangeOf);
  return {
    cars: count,
    total,
    stages: STAGES.map((stage, at) => ({ stage, range: stages[at] })),
    products: products.map(({ key, ...listed }) => ({ product: key, range: rangeOf(listed) })),
    consumables: consumables.map(({ key, ...listed }) => ({
      kind: key as ConsumableKind,
      range: rangeOf(listed),
    })),
  };
}

/** Minutes of the whole car, then of every stage over the cars with minutes in it. */
function readMinutes(source: QuoteSource, branchId: number, cars: Knex.QueryBuilder): Listed[] {
  const columns = ['act_minutes', ...STAGES.map((stage) => `act_${stage}`)];
  const lists = columns.map(
    (column, at) => `json_group_array(${column}) filter (where ${column} > 0) as list${at},
      count(distinct branch_id) filter (where ${column} > 0 and branch_id <> ?) as others${at}`,
  );
  const [row] = source.all<Record<string, string | number>>(
    cars.select(sql.raw(lists.join(', '), Array(columns.length).fill(branchId))),
  );
  return columns.map((_, at) => ({
    list: String(row?.[`list${at}`] ?? '[]'),
    others: Number(row?.[`others${at}`] ?? 0),
  }));
}

/** Of each key: what each car took, over the cars that list it. */
function readListed(
  source: QuoteSource,
  branchId: number,
  amounts: Knex.QueryBuilder,
): ({ key: string } & Listed)[] {
  return source.all(
    sql
      .from(amounts.as('amounts'))
      .groupBy('key')
      .orderBy('key')
      .select(
        'key',
        sql.raw(
          `json_group_array(amount) as list,
            count(distinct branch_id) filter (where branch_id <> ?) as others`,
          [branchId],
        ),
      ),
  );
}

function productsOf(source: QuoteSource, cars: Knex.QueryBuilder): Knex.QueryBuilder {
  return withProductLines(source, cars).select({
    key: 'products.code',
    branch_id: 'job_facts.branch_id',
    amount: 'job_products.ml',
  });
}

function consumablesOf(source: QuoteSource, cars: Knex.QueryBuilder): Knex.QueryBuilder {
  return cars
    .joinRaw('cross join ? on job_consumables.job_id = job_facts.job_id', [source.consumables()])
    .groupBy('kind', 'job_facts.job_id')
    .select({ key: 'kind', branch_id: 'job_facts.branch_id' }, sql.raw('sum(quantity) as amount'));
}

import type { Knex } from 'knex';
import { quoteMinutes, type QuoteMinutes } from '#shared/domain/quote-minutes';
import { STAGES, type BodyType, type ConsumableKind, type Stage } from '#shared/domain/vocabulary';
import { sql, type Query } from '../database';
import type { ScopedDb } from '../scoped-db';

/** How near a set of cars is to the one quoted, nearest first. */
export const QUOTE_RUNGS = ['model_age', 'body_age', 'age', 'package'] as const;
export type QuoteRung = (typeof QUOTE_RUNGS)[number];

/** The car that is quoted, as the facts of others are compared with it. */
export interface QuotedCar {
  packageId: number;
  modelKey: string;
  bodyType: BodyType;
  ageBandIndex: number;
  /** Jobs completed after one day, up to another. */
  after: string;
  upTo: string;
}

/** What a quote says of a set of cars: sums and quantiles, no car of it. */
export interface QuoteFigures {
  cars: number;
  withRot: number;
  bubblesWorked: number;
  bubblesHoled: number;
  minutes: QuoteMinutes;
  stages: { stage: Stage; minutes: QuoteMinutes }[];
  /** Σ ml of every product that went into any of the cars, by code. */
  products: { product: string; ml: number }[];
  /** Consumables that came with a price of their own, and bought-in. */
  ownCents: number;
  /** Consumables without a price, which take the network's of the day. */
  unpriced: { kind: ConsumableKind; quantity: number }[];
}

/** Where the rows of a quote come from: a branch's through its scope, the network's through its reference. */
export interface QuoteSource {
  facts: () => Knex.QueryBuilder;
  products: () => Knex.Raw;
  consumables: () => Knex.Raw;
  all: <Row>(query: Query) => Row[];
}

/** The source that holds the rows of a scope. */
export function scopedSource(db: ScopedDb): QuoteSource {
  return {
    facts: () => db.table('job_facts'),
    products: () => db.derived('job_products'),
    consumables: () => db.derived('job_consumables'),
    all: (query) => db.all(query),
  };
}

/** How many cars of each branch every rung has (rule 48). */
export function countRungs(
  source: QuoteSource,
  car: QuotedCar,
): (Record<QuoteRung, number> & { branchId: number })[] {
  const { modelKey, bodyType, ageBandIndex } = car;
  return source.all(
    alike(source.facts(), car)
      .groupBy('branch_id')
      .select(
        { branchId: 'branch_id' },
        sql.raw(
          `count(*) as package, sum(age_band = ?) as age, sum(age_band = ? and body_type = ?) as body_age,
            sum(age_band = ? and model_key = ?) as model_age`,
          [ageBandIndex, ageBandIndex, bodyType, ageBandIndex, modelKey],
        ),
      ),
  );
}

/** The figures of the cars of a rung; `undefined` when it has none. */
export function readQuoteFigures(
  source: QuoteSource,
  car: QuotedCar,
  rung: QuoteRung,
): QuoteFigures | undefined {
  const cars = (): Knex.QueryBuilder => carsOnRung(source, car, rung);
  const columns = ['act_minutes', ...STAGES.map((stage) => `act_${stage}`)];
  const lists = columns.map((column, at) => `json_group_array(${column}) as list${at}`);
  const [row] = source.all<Record<`list${number}`, string> & Record<FactSum, number>>(
    cars().select(
      sql.raw(
        `count(*) as cars, sum(has_rot) as "withRot", sum(bubbles_worked) as "bubblesWorked",
          sum(bubbles_holed) as "bubblesHoled", sum(bought_in_sent_cents) as "boughtIn", ${lists.join(', ')}`,
      ),
    ),
  );
  const products = readProducts(source, cars());
  const consumables = readConsumables(source, cars());
  if (!row || row.cars === 0) return undefined;
  const [minutes, ...stages] = columns.map((_, at) =>
    quoteMinutes(JSON.parse(row[`list${at}`] ?? '[]') as number[]),
  );
  return {
    cars: row.cars,
    withRot: row.withRot,
    bubblesWorked: row.bubblesWorked,
    bubblesHoled: row.bubblesHoled,
    minutes: minutes as QuoteMinutes,
    stages: STAGES.map((stage, at) => ({ stage, minutes: stages[at] as QuoteMinutes })),
    products,
    ownCents: row.boughtIn + consumables.reduce((all, { ownCents }) => all + ownCents, 0),
    unpriced: consumables.filter(({ quantity }) => quantity > 0),
  };
}

/** The cars of a rung. */
export function carsOnRung(
  source: QuoteSource,
  car: QuotedCar,
  rung: QuoteRung,
): Knex.QueryBuilder {
  return onRung(alike(source.facts(), car), car, rung);
}

type FactSum = 'cars' | 'withRot' | 'bubblesWorked' | 'bubblesHoled' | 'boughtIn';

/** Cars of the package asked for, of the last years, with minutes. */
function alike(query: Knex.QueryBuilder, car: QuotedCar): Knex.QueryBuilder {
  return query
    .where('job_facts.package_id', car.packageId)
    .where('job_facts.completed_on', '>', car.after)
    .where('job_facts.completed_on', '<=', car.upTo)
    .where('act_minutes', '>', 0);
}

function onRung(query: Knex.QueryBuilder, car: QuotedCar, rung: QuoteRung): Knex.QueryBuilder {
  if (rung !== 'package') query.where('age_band', car.ageBandIndex);
  if (rung === 'body_age') query.where('job_facts.body_type', car.bodyType);
  if (rung === 'model_age') query.where('model_key', car.modelKey);
  return query;
}

/** Each product line of each of the cars. */
export function withProductLines(source: QuoteSource, cars: Knex.QueryBuilder): Knex.QueryBuilder {
  return cars
    .joinRaw(
      `cross join ? on job_products.branch_id = job_facts.branch_id and job_products.job_id = job_facts.job_id
        and job_products.completed_on = job_facts.completed_on`,
      [source.products()],
    )
    .join('products', 'products.id', 'job_products.product_id');
}

function readProducts(source: QuoteSource, cars: Knex.QueryBuilder): QuoteFigures['products'] {
  return source.all(
    withProductLines(source, cars)
      .groupBy('products.code')
      .havingRaw('sum(job_products.ml) > 0')
      .orderBy('products.code')
      .select({ product: 'products.code' })
      .sum({ ml: 'job_products.ml' }),
  );
}

/** What consumables of each kind cost by their own prices, and how many have none. */
function readConsumables(
  source: QuoteSource,
  cars: Knex.QueryBuilder,
): { kind: ConsumableKind; ownCents: number; quantity: number }[] {
  return source.all(
    cars
      .joinRaw('cross join ? on job_consumables.job_id = job_facts.job_id', [source.consumables()])
      .groupBy('kind')
      .orderBy('kind')
      .select(
        'kind',
        sql.raw(
          `coalesce(sum(quantity * unit_cost_cents), 0) as "ownCents",
            coalesce(sum(quantity) filter (where unit_cost_cents is null), 0) as quantity`,
        ),
      ),
  );
}

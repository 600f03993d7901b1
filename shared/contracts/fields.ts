import * as z from 'zod';
import { BODY_TYPES, ROLES } from '#shared/domain/vocabulary';
import { isDate, isMonth } from '#shared/domain/calendar';
import { hasSixDecimals } from '#shared/domain/money';

/** Fields that several contracts share, with the limits of rule 55. */

/** An integer amount of the network's currency in minor units, 0 … 10⁹. */
export const cents = z.int().min(0).max(1_000_000_000);
/** Whole minutes, 0 … 10⁵. */
export const minutes = z.int().min(0).max(100_000);
/** Whole millilitres, 0 … 10⁶. */
export const millilitres = z.int().min(0).max(1_000_000);
/** A signed sum of minor units in an answer. */
export const centsSum = z.int();
/** A share, ratio or quantile in an answer, unrounded; null where there is nothing to say it of or rule 13 withholds it. */
export const share = z.number().nullable();

export const date = z.string().refine(isDate, 'a date is written YYYY-MM-DD');
export const month = z.string().refine(isMonth, 'a month is written YYYY-MM');

const CONTROL_OR_LONE_SURROGATE = /[\p{Cc}\p{Cs}]/u;

/** A branch's own reference of a job, claim or booking: 1–64 characters, normalised to NFC, case-sensitive. */
export const reference = z
  .string()
  .transform((text) => text.normalize('NFC'))
  .pipe(
    z
      .string()
      .min(1, 'a reference has 1 to 64 characters')
      .refine((text) => [...text].length <= 64, 'a reference has 1 to 64 characters')
      .refine((text) => text === text.trim(), 'a reference has no space at its edges')
      // A client that tidies addresses takes these two out of a path: the job could never be read again.
      .refine((text) => text !== '.' && text !== '..', 'a reference is more than dots')
      .refine(
        (text) => !CONTROL_OR_LONE_SURROGATE.test(text),
        'a reference has no control characters',
      ),
  );

/** Code of a product, branch or region. */
export const code = z
  .string()
  .regex(/^[A-Z0-9]{2,12}$/, 'a code is 2 to 12 capital letters or digits');
/** Code of a package. */
export const packageCode = z
  .string()
  .regex(
    /^[a-z][a-z0-9_]{1,23}$/,
    'a package code is a small letter and 1 to 23 small letters, digits or _',
  );
export const bodyType = z.enum(BODY_TYPES);
export const role = z.enum(ROLES);

/** One line of text: no control characters. */
export const line = (max: number) =>
  z
    .string()
    .max(max, `at most ${max} characters`)
    .refine((text) => !CONTROL_OR_LONE_SURROGATE.test(text), 'no control characters');
/** A name that must say something. */
export const name = line(120).refine((text) => text.trim().length > 0, 'must not be empty');
/** Free text of several lines: line ends and tabs, no other control characters. */
export const prose = z
  .string()
  .max(4000, 'at most 4000 characters')
  .refine(
    (text) => !CONTROL_OR_LONE_SURROGATE.test(text.replace(/[\t\r\n]/g, '')),
    'no control characters but line ends and tabs',
  );
/** A fraction with at most six decimals, 0 … 1 (fee rates, rule 10). */
export const rate = z.number().min(0).max(1).refine(hasSixDecimals, 'at most 6 decimals');
export const shareInput = z.number().min(0).lt(1);

export const noParams = z.strictObject({});
export const noQuery = z.strictObject({});
export const branchParams = z.strictObject({ branch: z.string() });

/** A parameter that may be repeated. */
export const manyOf = <T extends z.ZodType>(item: T) =>
  z.preprocess(
    (value) => (value === undefined ? undefined : Array.isArray(value) ? value : [value]),
    z.array(item).optional(),
  );
/** A code asked for in a query: any text, because a code out of scope is answered as one that does not exist (rule 22). */
const askedCode = z.string().max(64);

/** Filters that every analytics call takes. */
export const scopeQuery = z.strictObject({
  from: date.optional(),
  to: date.optional(),
  region: manyOf(askedCode),
  branch: manyOf(askedCode),
  package: manyOf(z.string().max(64)),
  bodyType: manyOf(bodyType),
});
export type ScopeQuery = z.output<typeof scopeQuery>;

/** `?limit=&cursor=` of a list (rule 67). */
export const pageQuery = {
  limit: z
    .string()
    .regex(/^\d{1,9}$/, 'a whole number from 1 to 200')
    .transform(Number)
    .pipe(z.int().min(1).max(200))
    .default(50),
  cursor: z.string().max(1000).optional(),
};
/** `true` or `false` in a query. */
export const flag = z.enum(['true', 'false']).transform((value) => value === 'true');

export const period = z.strictObject({ from: date, to: date });
export const scopeEcho = z.strictObject({ regions: z.array(code), branches: z.array(code) });

/** A cost that was not known on a job's day (rule 11). `code` names the branch, product, consumable kind or network. */
export const missingCost = z.strictObject({
  kind: z.enum(['hourlyCost', 'product', 'consumable', 'fee']),
  code: z.string(),
  on: date,
});

/** RFC 9457 problem document; `problems` name each bad field by JSON pointer. */
export const problemDocument = z.strictObject({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  problems: z.array(z.strictObject({ path: z.string(), message: z.string() })).optional(),
});
export type ProblemDocument = z.output<typeof problemDocument>;
export type FieldProblem = { path: string; message: string };

/** Access lists by role (rule 23). */
export const EVERYONE = { roles: ROLES, pushKey: false } as const;
export const SENDERS = {
  roles: ['recorder', 'site_manager', 'head_office'],
  pushKey: true,
} as const;
export const MANAGERS = { roles: ['site_manager', 'head_office'], pushKey: false } as const;
export const READERS = {
  roles: ['site_manager', 'regional_lead', 'head_office'],
  pushKey: false,
} as const;
export const HEAD_OFFICE = { roles: ['head_office'], pushKey: false } as const;

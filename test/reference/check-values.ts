import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** How near a figure must come; meeting one of them is enough. `sd_relative` and the like hold for that figure alone. */
export type Tolerance = Record<string, number>;

/** A value, or a list of values, that a case expects; null where one of a list is not defined. */
export type Figure = number | string | readonly (number | null)[] | readonly string[];

/** One case of a method, as `check-values.json` keeps it. */
export interface CheckCase<Input> {
  id: string;
  source: string;
  input: Input;
  expected: Record<string, Figure>;
  tolerance: Tolerance;
  published?: Record<string, Figure>;
}

type Methods = Record<string, { cases: CheckCase<unknown>[] }>;

const methods = JSON.parse(
  readFileSync(join(__dirname, 'check-values.json'), 'utf8'),
) as unknown as Methods;

/** Every case of a method, each beside the words that name it and its source in a test's title. */
export function checkCases<Input>(method: string): [title: string, check: CheckCase<Input>][] {
  const cases = methods[method]?.cases ?? [];
  if (cases.length === 0) throw new Error(`no check values for ${method}`);
  return cases.map((check) => [`${check.id} (${check.source})`, check as CheckCase<Input>]);
}

import type { OutOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/set-up';
import type { Api } from '../../core/api/api';
import type { ChangeOf } from './change-of';
import { type Field, textOf, type Typed } from './field';
import { numberOf } from './read-field';

/** A region as the catalogue has it. */
export type Region = OutOf<typeof contract.putRegion>;
/** The yearly means that its air is known by. */
export type Climate = NonNullable<Region['climate']>;

/** The four means, in the order in which they are asked for, and where each may lie. */
const MEANS = [
  {
    key: 'temperatureC',
    label: 'Temperature, °C',
    hint: 'Mean of a year.',
    from: -60,
    to: 60,
  },
  {
    key: 'humidityPct',
    label: 'Relative humidity, %',
    hint: 'Mean of a year.',
    from: 0,
    to: 100,
  },
  {
    key: 'so2Deposition',
    label: 'Sulphur dioxide, mg per m² a day',
    hint: 'What settles in a day, mean of a year.',
    from: 0,
    to: 10_000,
  },
  {
    key: 'chlorideDeposition',
    label: 'Chloride, mg per m² a day',
    hint: 'What settles in a day, mean of a year.',
    from: 0,
    to: 10_000,
  },
] as const;

/** Name and climate of a region; without one, a new region. */
export function regionChange(
  api: Api,
  taken: readonly string[],
  region?: Region,
): ChangeOf<Region> {
  const name: Field = { key: 'name', label: 'Name of the region', kind: 'text' };
  return {
    label: region ? `Region ${region.name}` : 'A new region',
    act: region ? 'Save the region' : 'Add the region',
    fields: [
      ...(region
        ? []
        : [
            {
              key: 'code',
              label: 'Code',
              kind: 'code',
              taken,
              hint: '2 to 12 capital letters or digits. It cannot be changed later.',
            } as const,
          ]),
      name,
      ...MEANS.map(({ key, label, hint }): Field => ({
        key,
        label,
        hint,
        kind: 'decimal',
        need: 'optional',
      })),
    ],
    check: wrongInClimate,
    start: {
      name: region?.name ?? '',
      ...Object.fromEntries(MEANS.map(({ key }) => [key, meanToType(region?.climate, key)])),
    },
    ...(region
      ? {
          change: (typed: Typed) =>
            climateTyped(typed) && { kind: 'climate' as const, region: region.code },
        }
      : {}),
    save: (typed) => {
      const climate = climateTyped(typed);
      return api.call(contract.putRegion, {
        params: { code: region?.code ?? textOf(typed, 'code') },
        body: { name: textOf(typed, 'name'), ...(climate ? { climate } : {}) },
      });
    },
  };
}

/** The climate as typed; nothing while one of its four means is missing or is none. */
export function climateTyped(typed: Typed): Climate | undefined {
  if (Object.keys(wrongInClimate(typed)).length > 0) return undefined;
  const [temperatureC, humidityPct, so2Deposition, chlorideDeposition] = MEANS.map(({ key }) =>
    numberOf(typed, key),
  );
  if (
    temperatureC === undefined ||
    humidityPct === undefined ||
    so2Deposition === undefined ||
    chlorideDeposition === undefined
  ) {
    return undefined;
  }
  return { temperatureC, humidityPct, so2Deposition, chlorideDeposition };
}

/** What is wrong with the four means taken together: all or none, each where it can lie. */
export function wrongInClimate(typed: Typed): Readonly<Record<string, string>> {
  const some = MEANS.some(({ key }) => textOf(typed, key) !== '');
  const wrong: Record<string, string> = {};
  for (const { key, from, to } of MEANS) {
    const value = numberOf(typed, key);
    if (value !== undefined && (value < from || value > to)) {
      wrong[key] = `Between ${from} and ${to}.`;
    } else if (some && textOf(typed, key) === '') {
      wrong[key] = 'A climate has all four; leave all empty to go without.';
    }
  }
  return wrong;
}

function meanToType(climate: Climate | null | undefined, key: keyof Climate): string {
  return climate ? String(climate[key]) : '';
}

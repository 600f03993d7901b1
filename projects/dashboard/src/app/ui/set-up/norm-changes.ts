import type { OutOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/set-up';
import type { getNormMedians } from '#shared/contracts/set-up-help';
import type { BodyType } from '#shared/domain/vocabulary';
import type { Api } from '../../core/api/api';
import { formatCars, formatVolume } from '../format';
import { BODY_TYPE_PLURALS } from '../words';
import type { ChangeOf } from './change-of';
import { type Offer, textOf, type Typed } from './field';
import type { Package } from './package-changes';
import { wholeOf } from './read-field';

type Medians = OutOf<typeof getNormMedians>;
type Norms = OutOf<typeof contract.putNorms>['norms'];

/** What a norm is built from. */
export interface NormSurroundings {
  readonly sold: Package;
  readonly bodyType: BodyType;
  readonly products: readonly { readonly code: string; readonly name: string }[];
  /** The norm as it stands. */
  readonly norms: Norms;
  /** What the network itself used, once it is known. */
  readonly medians?: Medians | undefined;
}

/** The product expected for a package on a body type. */
export function normChange(
  api: Api,
  { sold, bodyType, products, norms, medians }: NormSurroundings,
): ChangeOf<OutOf<typeof contract.putNorms>> {
  const typedNorms = (typed: Typed): Norms =>
    products
      .filter(({ code }) => textOf(typed, code) !== '')
      .map(({ code }) => ({ product: code, ml: wholeOf(typed, code) }));
  return {
    label: `Norm of ${sold.name} on ${BODY_TYPE_PLURALS[bodyType]}`,
    act: 'Save the norm',
    fields: products.map(({ code, name }) => ({
      key: code,
      label: `${name}, ml`,
      kind: 'whole' as const,
      need: 'optional' as const,
      ...offered(code, medians),
    })),
    start: Object.fromEntries(
      products.map(({ code }) => {
        const norm = norms.find(({ product }) => product === code);
        return [code, norm ? String(norm.ml) : ''];
      }),
    ),
    change: (typed) => ({
      kind: 'norm',
      package: sold.code,
      bodyType,
      norms: typedNorms(typed),
    }),
    save: (typed) =>
      api.call(contract.putNorms, {
        params: { code: sold.code, bodyType },
        body: { norms: typedNorms(typed) },
      }),
  };
}

/** The network's own use as an offer: the median, and between what most cars lay. */
export function medianOffer(row: Medians['products'][number]): Offer {
  const { cars, medianMl, p10Ml, p90Ml } = row;
  if (medianMl === null)
    return { words: `${formatCars(cars)} so far: too few to take a norm from.` };
  const between =
    p10Ml === null || p90Ml === null
      ? ''
      : `, eight of ten between ${formatVolume(p10Ml)} and ${formatVolume(p90Ml)}`;
  return {
    words: `Median of ${formatCars(cars)}: ${formatVolume(medianMl)}${between}.`,
    value: String(Math.round(medianMl)),
  };
}

function offered(code: string, medians: Medians | undefined): { offer?: Offer } {
  const row = medians?.products.find(({ product, cars }) => product === code && cars > 0);
  return row ? { offer: medianOffer(row) } : {};
}

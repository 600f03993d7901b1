import type { OutOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/set-up';
import {
  CONSUMABLE_KINDS,
  type ConsumableKind,
  PRODUCT_KINDS,
  type ProductKind,
} from '#shared/domain/vocabulary';
import type { Api } from '../../core/api/api';
import { CONSUMABLE_NAMES, PRODUCT_KIND_NAMES } from '../words';
import type { ChangeOf } from './change-of';
import { type Field, textOf, type Typed } from './field';
import { centsOf } from './read-field';

/** A product as the catalogue has it. */
export type Product = OutOf<typeof contract.putProduct>;

const FROM: Field = {
  key: 'from',
  label: 'From the day',
  kind: 'date',
  hint: 'Cars finished on that day and after it are counted at this cost.',
};

/** Name and kind of a product; without one, a new product. */
export function productChange(
  api: Api,
  taken: readonly string[],
  product?: Product,
): ChangeOf<Product> {
  return {
    label: product ? `Product ${product.name}` : 'A new product',
    act: product ? 'Save the product' : 'Add the product',
    ...(product ? {} : { after: 'clear' as const }),
    fields: [
      ...(product
        ? []
        : [
            {
              key: 'code',
              label: 'Code',
              kind: 'code',
              taken,
              hint: '2 to 12 capital letters or digits, as jobs name it. It cannot be changed later.',
            } as const,
          ]),
      { key: 'name', label: 'Name of the product', kind: 'text' },
      {
        key: 'kind',
        label: 'Kind',
        kind: 'choice',
        choices: PRODUCT_KINDS.map((kind) => ({ value: kind, name: PRODUCT_KIND_NAMES[kind] })),
      },
    ],
    start: { name: product?.name ?? '', kind: product?.kind ?? '' },
    save: (typed) =>
      api.call(contract.putProduct, {
        params: { code: product?.code ?? textOf(typed, 'code') },
        body: { name: textOf(typed, 'name'), kind: textOf(typed, 'kind') as ProductKind },
      }),
  };
}

/** The day on which the first of some branches opened. */
export function firstOpening(
  branches: readonly { readonly openedOn: string }[],
): string | undefined {
  return branches.map(({ openedOn }) => openedOn).sort()[0];
}

/** What a litre of a product costs, from a day on; the day offered first is the caller's. */
export function productCostChange(
  api: Api,
  product: string,
  from: string,
): ChangeOf<OutOf<typeof contract.putProductCost>> {
  return {
    label: 'Cost from a day on',
    act: 'Save the cost',
    after: 'clear',
    fields: [FROM, { key: 'costPerLitreCents', label: 'Cost of a litre', kind: 'money' }],
    start: { from },
    change: (typed) => ({
      kind: 'productCost',
      product,
      from: textOf(typed, 'from'),
      costPerLitreCents: centsOf(typed, 'costPerLitreCents'),
    }),
    save: (typed) =>
      api.call(contract.putProductCost, {
        params: { code: product, from: textOf(typed, 'from') },
        body: { costPerLitreCents: centsOf(typed, 'costPerLitreCents') },
      }),
  };
}

/** What one of a kind of consumable costs, from a day on. */
export function consumableCostChange(
  api: Api,
  today: string,
): ChangeOf<OutOf<typeof contract.putConsumableCost>> {
  const kindOf = (typed: Typed): ConsumableKind => textOf(typed, 'kind') as ConsumableKind;
  return {
    label: 'Cost of a consumable from a day on',
    act: 'Save the cost',
    after: 'clear',
    fields: [
      {
        key: 'kind',
        label: 'Consumable',
        kind: 'choice',
        choices: CONSUMABLE_KINDS.map((kind) => ({ value: kind, name: CONSUMABLE_NAMES[kind] })),
      },
      FROM,
      {
        key: 'unitCostCents',
        label: 'Cost of one',
        kind: 'money',
        hint: 'Used where a job names no price of its own.',
      },
    ],
    start: { kind: '', from: today },
    change: (typed) => ({
      kind: 'consumableCost',
      consumable: kindOf(typed),
      from: textOf(typed, 'from'),
      unitCostCents: centsOf(typed, 'unitCostCents'),
    }),
    save: (typed) =>
      api.call(contract.putConsumableCost, {
        params: { kind: kindOf(typed), from: textOf(typed, 'from') },
        body: { unitCostCents: centsOf(typed, 'unitCostCents') },
      }),
  };
}

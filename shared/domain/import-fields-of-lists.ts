import { importField, type ImportField } from './import-field';
import { ACTIONS, CONDITIONS, SIDES, ZONES } from './vocabulary';

/** How many findings and how many products by number a row has places for. */
export const FINDING_PLACES = 6;
export const PRODUCT_PLACES = 6;

/** A column for each product of the catalogue, and places for any product by its code. */
export function productFields(products: readonly { code: string; name: string }[]): ImportField[] {
  return [...products.map(productColumn), ...numbered(PRODUCT_PLACES, productPair)];
}

/** The columns of every place for a finding. */
export function findingFields(): ImportField[] {
  return numbered(FINDING_PLACES, findingColumns);
}

function productColumn({ code, name }: { code: string; name: string }): ImportField {
  return importField({
    field: `product.${code}.ml`,
    label: `${name} (${code}) ml`,
    kind: 'whole',
    names: [`${code} ml`, code, `products.${code}`, `products.${code}.ml`, `${name} ml`],
    hint: `Millilitres of ${code}; empty or 0: not used.`,
  });
}

function productPair(place: number): ImportField[] {
  return [
    importField({
      field: `product.${place}`,
      label: `Product ${place}`,
      kind: 'text',
      names: [`product ${place} code`],
      hint: `Code of a product, with its millilitres in "ml ${place}".`,
    }),
    importField({
      field: `ml.${place}`,
      label: `ml ${place}`,
      kind: 'whole',
      names: [`product ${place} ml`, `product ${place} millilitres`],
      hint: `Millilitres of "product ${place}".`,
    }),
  ];
}

function findingColumns(place: number): ImportField[] {
  const of = (
    key: string,
    label: string,
    given: Pick<ImportField, 'kind'> & Partial<ImportField>,
  ): ImportField =>
    importField({
      field: `finding${place}.${key}`,
      label: `Finding ${place}: ${label}`,
      names: [`finding ${place} ${label}`, `findings.${place}.${key}`],
      ...given,
    });
  return [
    of('zone', 'zone', { kind: 'choice', choices: ZONES }),
    of('side', 'side', { kind: 'choice', choices: SIDES }),
    of('seenAs', 'seen as', { kind: 'choice', choices: CONDITIONS }),
    of('workedAs', 'worked as', { kind: 'choice', choices: CONDITIONS }),
    of('structural', 'structural', { kind: 'yesno' }),
    of('action', 'action', { kind: 'choice', choices: ACTIONS }),
    of('repairMinutes', 'repair minutes', { kind: 'minutes' }),
    of('charged', 'charged', { kind: 'amount', fills: `finding${place}.chargedCents` }),
    of('chargedCents', 'charged in minor units', { kind: 'cents' }),
  ];
}

function numbered(places: number, fieldsOf: (place: number) => ImportField[]): ImportField[] {
  return Array.from({ length: places }, (_, at) => fieldsOf(at + 1)).flat();
}

import { importField, type ImportField } from './import-field';
import { findingFields, productFields } from './import-fields-of-lists';
import { BODY_TYPES, CHECK_ANSWERS, CHECKS, CONSUMABLE_KINDS, STAGES } from './vocabulary';

interface Catalogue {
  products: readonly { code: string; name: string }[];
  packages: readonly { code: string }[];
}

/** What a column of a file of jobs may fill, products as the catalogue has them. */
export function jobFields({ products, packages }: Catalogue): ImportField[] {
  return [
    ...CAR_AND_DAYS(packages.map(({ code }) => code)),
    ...ESTIMATE_AND_WORK,
    ...productFields(products),
    ...CONSUMABLES,
    ...CHECKS_AND_WORKSHOP,
    ...BILL,
    ...findingFields(),
  ];
}

const CAR_AND_DAYS = (packages: readonly string[]): ImportField[] => [
  importField({
    field: 'jobRef',
    label: 'Job reference',
    kind: 'reference',
    required: true,
    names: ['job', 'job number', 'job no', 'job id', 'order', 'order number', 'reference', 'ref'],
  }),
  importField({
    field: 'vehicle.key',
    label: 'Car key',
    kind: 'text',
    names: ['key', 'vehicle key', 'car number', 'car id'],
    hint: "The branch's own meaningless key of the car; no number plate.",
  }),
  importField({
    field: 'vehicle.make',
    label: 'Make',
    kind: 'text',
    required: true,
    names: ['vehicle make', 'car make'],
  }),
  importField({
    field: 'vehicle.model',
    label: 'Model',
    kind: 'text',
    required: true,
    names: ['car model'],
  }),
  importField({
    field: 'vehicle.bodyType',
    label: 'Body type',
    kind: 'choice',
    required: true,
    choices: BODY_TYPES,
    names: ['body', 'body style'],
  }),
  importField({
    field: 'vehicle.firstRegistered',
    label: 'First registered',
    kind: 'month',
    required: true,
    names: ['first registration', 'registered', 'date of first registration', 'registered on'],
  }),
  importField({
    field: 'vehicle.odometerKm',
    label: 'Odometer km',
    kind: 'whole',
    names: ['odometer', 'km', 'mileage km', 'odometer reading'],
  }),
  importField({
    field: 'package',
    label: 'Package',
    kind: 'choice',
    required: true,
    choices: packages,
    hint: 'Code or name of the package sold.',
    names: ['package sold', 'package code', 'package name'],
  }),
  importField({
    field: 'bookedOn',
    label: 'Booked on',
    kind: 'date',
    names: ['booked', 'booking date', 'date booked'],
  }),
  importField({
    field: 'startedOn',
    label: 'Started on',
    kind: 'date',
    names: ['started', 'start', 'start date', 'date started'],
  }),
  importField({
    field: 'completedOn',
    label: 'Completed on',
    kind: 'date',
    required: true,
    names: ['completed', 'completion', 'completion date', 'date completed', 'finished', 'done on'],
  }),
];

const ESTIMATE_AND_WORK: readonly ImportField[] = [
  importField({
    field: 'estimate.price',
    label: 'Price',
    kind: 'amount',
    fills: 'estimate.priceCents',
    names: ['estimate', 'quoted price', 'price quoted', 'quote', 'estimated price'],
    hint: 'The price quoted before tax; a job without it counts as one without estimate.',
  }),
  importField({ field: 'estimate.priceCents', label: 'Price in minor units', kind: 'cents' }),
  ...STAGES.map((stage) =>
    importField({
      field: `estimate.${stage}`,
      label: `Estimated minutes: ${stage}`,
      kind: 'minutes',
      names: [
        `estimate.stages.${stage}`,
        `estimated ${stage}`,
        `estimate ${stage} minutes`,
        `estimated ${stage} minutes`,
        `planned ${stage}`,
      ],
    }),
  ),
  ...STAGES.map((stage) =>
    importField({
      field: `actual.${stage}`,
      label: `Minutes worked: ${stage}`,
      kind: 'minutes',
      names: [
        `actual.stages.${stage}`,
        `actual ${stage} minutes`,
        `${stage} minutes`,
        `worked ${stage}`,
        stage,
      ],
    }),
  ),
];

const CONSUMABLES: readonly ImportField[] = [
  ...CONSUMABLE_KINDS.flatMap((kind) => {
    const words = kind.replaceAll('_', ' ');
    return [
      importField({
        field: `consumables.${kind}.quantity`,
        label: `Quantity of ${words}`,
        kind: 'whole',
        names: [`${kind} quantity`, ...(kind === 'other' ? [] : [kind, `${kind}s`])],
        hint: 'Pieces; empty or 0: none used.',
      }),
      importField({
        field: `consumables.${kind}.unitCost`,
        label: `Unit cost of ${words}`,
        kind: 'amount',
        fills: `consumables.${kind}.unitCostCents`,
        names: [`${kind} unit cost`, `${kind} cost`],
      }),
      importField({
        field: `consumables.${kind}.unitCostCents`,
        label: `Unit cost of ${words} in minor units`,
        kind: 'cents',
        names: [`${kind} unit cost cents`],
      }),
    ];
  }),
  importField({
    field: 'boughtIn',
    label: 'Bought in',
    kind: 'amount',
    fills: 'boughtInCents',
    names: ['bought-in amount', 'bought in work'],
  }),
  importField({ field: 'boughtInCents', label: 'Bought in, in minor units', kind: 'cents' }),
];

const CHECKS_AND_WORKSHOP: readonly ImportField[] = [
  ...CHECKS.map((check) =>
    importField({
      field: `checks.${check}`,
      label: wordsOf(check),
      kind: 'choice',
      choices: CHECK_ANSWERS,
      hint: 'yes, no or na (also y, n, 1, 0, true, false, n/a).',
      names: [check, `check ${check}`],
    }),
  ),
  importField({
    field: 'workshop.temperatureC',
    label: 'Temperature °C',
    kind: 'decimal',
    names: ['temperature', 'workshop temperature', 'temp'],
  }),
  importField({
    field: 'workshop.humidityPct',
    label: 'Humidity %',
    kind: 'decimal',
    names: ['humidity', 'workshop humidity'],
  }),
];

const BILL: readonly ImportField[] = [
  importField({
    field: 'invoice.number',
    label: 'Invoice number',
    kind: 'text',
    names: ['invoice', 'invoice no', 'bill number'],
  }),
  importField({
    field: 'invoice.issuedOn',
    label: 'Invoice issued on',
    kind: 'date',
    names: ['invoice date', 'invoiced on', 'billed on', 'bill date'],
  }),
  importField({
    field: 'invoice.total',
    label: 'Invoice total',
    kind: 'amount',
    fills: 'invoice.totalCents',
    names: ['invoice amount', 'billed', 'total', 'bill total'],
  }),
  importField({
    field: 'invoice.totalCents',
    label: 'Invoice total in minor units',
    kind: 'cents',
  }),
  importField({
    field: 'notes',
    label: 'Notes',
    kind: 'text',
    names: ['note', 'remarks', 'comment'],
  }),
];

/** `linersOff` → "Liners off". */
function wordsOf(name: string): string {
  const words = name.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
  return words.charAt(0).toUpperCase() + words.slice(1);
}

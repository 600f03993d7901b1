import { CHECKS, CONSUMABLE_KINDS, STAGES } from '#shared/domain/vocabulary';
import { CHECK_NAMES, CONSUMABLE_NAMES, SIDE_NAMES, STAGE_NAMES, ZONE_NAMES } from '../../ui/words';
import { type DraftDocument, valueAt } from './draft-document';

/** What the name of a product is, by its code. */
export type ProductName = (code: string) => string;

const NAMES: Readonly<Record<string, string>> = {
  '/jobRef': 'The reference',
  '/vehicle': 'The car',
  '/vehicle/make': 'The make',
  '/vehicle/model': 'The model',
  '/vehicle/bodyType': 'The body type',
  '/vehicle/firstRegistered': 'The month of first registration',
  '/vehicle/odometerKm': 'The odometer',
  '/vehicle/key': 'The key',
  '/package': 'The package',
  '/bookedOn': 'The day booked',
  '/startedOn': 'The day started',
  '/completedOn': 'The day finished',
  '/estimate/priceCents': 'The price quoted',
  '/findings': 'The findings',
  '/workshop/temperatureC': 'The temperature of the workshop',
  '/workshop/humidityPct': 'The humidity of the workshop',
  '/invoice': 'The bill',
  '/invoice/number': 'The number of the bill',
  '/invoice/issuedOn': 'The day of the bill',
  '/invoice/totalCents': 'The bill before tax',
  '/boughtInCents': 'Bought in',
  '/notes': 'The notes',
  ...Object.fromEntries(
    STAGES.map((one) => [`/actual/stages/${one}`, `Stage ${STAGE_NAMES[one]}`]),
  ),
  ...Object.fromEntries(
    STAGES.map((one) => [`/estimate/stages/${one}`, `The estimate of stage ${STAGE_NAMES[one]}`]),
  ),
  ...Object.fromEntries(CHECKS.map((one) => [`/checks/${one}`, `The check "${CHECK_NAMES[one]}"`])),
  ...Object.fromEntries(
    CONSUMABLE_KINDS.map((one) => [`/consumables/${one}`, `Consumables, ${CONSUMABLE_NAMES[one]}`]),
  ),
};

const OF_FINDING: Readonly<Record<string, string>> = {
  zone: 'zone',
  side: 'side',
  seenAs: '"seen as"',
  workedAs: '"worked as"',
  structural: '"load-bearing"',
  action: '"done"',
  repairMinutes: 'repair minutes',
  chargedCents: 'the amount charged',
  note: 'note',
};
const OF_EXTRA: Readonly<Record<string, string>> = {
  on: 'the day',
  minutes: 'the minutes',
  priceCents: 'the price',
  note: 'the note',
};
const IN_MESSAGES: readonly (readonly [RegExp, string])[] = [
  [/\bbookedOn\b/g, 'the day booked'],
  [/\bstartedOn\b/g, 'the day started'],
  [/\bcompletedOn\b/g, 'the day finished'],
];

/** A field of the form as the subject of a sentence: "The make", "Finding 2, worked as". */
export function fieldName(document: DraftDocument, path: string, product: ProductName): string {
  const known = NAMES[path];
  if (known) return known;
  const [, list = '', key = '', field = ''] = path.split('/');
  if (list === 'findings') return findingField(document, key, field);
  if (list === 'products') return `Product, ${product(key)}`;
  if (list === 'agreedExtras') {
    return `Agreed beyond the quote, ${Number(key) + 1}: ${OF_EXTRA[field] ?? field}`;
  }
  return NAMES[path.slice(0, path.lastIndexOf('/'))] ?? 'Something';
}

/** A problem as a sentence about its field. */
export function problemSentence(
  document: DraftDocument,
  { path, message }: { readonly path: string; readonly message: string },
  product: ProductName,
): string {
  return aboutField(fieldName(document, path, product), message);
}

/** A rule's message after the name it speaks of: as one sentence where it goes on from it, else set off from it. */
export function aboutField(name: string, message: string): string {
  const said = messageWords(message);
  return `${name}${/^(is|are|has|have|must|cannot)\b/.test(said) ? '' : ':'} ${said}.`;
}

/** A rule's message in the form's own words. */
export function messageWords(message: string): string {
  const said = IN_MESSAGES.reduce((text, [name, words]) => text.replace(name, words), message);
  return said.startsWith('is required') ? 'is still missing' : said;
}

/** A finding by its number on the map and its place: "Finding 2, sill, inner, left". */
export function findingName(document: DraftDocument, ref: string): string {
  const findings = document.findings ?? [];
  const index = findings.findIndex((one) => one.ref === ref);
  const { zone, side } = findings[index] ?? {};
  const place = [zone && ZONE_NAMES[zone], side && SIDE_NAMES[side]].filter(Boolean);
  return [`Finding ${index + 1}`, ...place].join(', ');
}

function findingField(document: DraftDocument, key: string, field: string): string {
  const ref = key.replaceAll('~1', '/').replaceAll('~0', '~');
  const known = valueAt(document, `/findings/${key}`) !== undefined;
  const name = known ? findingName(document, ref) : 'A finding';
  return name + (OF_FINDING[field] ? `, ${OF_FINDING[field]}` : '');
}

/** Steps to values in an answer; `*` is every item of a list. */
type Path = readonly string[];

/** What a branch is compared with, and what comes of it. */
const COMPARED = [
  ...['expected', 'lower95', 'upper95', 'lower998', 'upper998', 'flag', 'expectedClaims'],
];

/** Answers that hold figures of the whole network, and the only places in which those stand (rule 81). */
const REFERENCE_FIELDS: Readonly<Record<string, readonly Path[]>> = {
  '/api/analytics/rot': [
    ['bands', '*', 'referenceShare'],
    ['regions', '*', 'adjustedShare'],
    ['regions', '*', 'adjustedLower'],
    ['regions', '*', 'adjustedUpper'],
    ['regions', '*', 'bandsLeftOut'],
  ],
  '/api/analytics/branches': [
    ['network'],
    ['referenceCars'],
    ...COMPARED.map((field) => ['branches', '*', field]),
  ],
  '/api/analytics/branches/side-by-side': [
    ['network'],
    ...['expected', 'flag', 'steps'].map((field) => ['branches', '*', field]),
  ],
  '/api/analytics/warranty': [
    ...['branches', 'cohorts'].flatMap((rows) =>
      ['expected', 'ratio', 'lower', 'upper'].map((field) => [rows, '*', field]),
    ),
    ['expectedRates', '*', 'claims'],
    ['expectedRates', '*', 'carYears'],
  ],
};

/** Files with such figures, and the columns in which those stand. */
const REFERENCE_COLUMNS: Readonly<Record<string, readonly string[]>> = {
  '/api/exports/branches.csv': COMPARED,
  '/api/exports/warranty-branches.csv': ['expected', 'ratio', 'lower', 'upper'],
  '/api/exports/warranty-cohorts.csv': ['expected', 'ratio', 'lower', 'upper'],
};

/** Answers that are a figure of the network as a whole once they say so, and then may change anywhere. */
const WHOLE_ANSWERS: Readonly<Record<string, (answer: unknown) => boolean>> = {
  '/api/quote': (answer) =>
    (answer as { basis?: { source: string | null } }).basis?.source === 'network',
};

/** What a car usually takes is a figure of the network once the answer says so; what was used last time is the branch's own. */
const USUAL_AT = /^\/api\/branches\/[^/]+\/usual$/;

function withoutUsual(answer: unknown): unknown {
  const { basis, lastTime } = answer as { basis?: { source: string | null }; lastTime?: unknown };
  return basis?.source === 'network' ? { lastTime } : answer;
}

/** An action's effect is told against the network once it says so; what the branch's own cars did is its own. */
const ACTION_AT = /^\/api\/branches\/[^/]+\/actions\/[^/]+$/;
const EFFECT_FIELDS: readonly Path[] = [
  ...['before', 'after'].map((side) => ['effect', side, 'expected']),
  ...['change', 'lower', 'upper'].map((field) => ['effect', field]),
];

/** Whether any answer at a path may hold figures of the network. */
export function mayRefer(path: string): boolean {
  return (
    path in REFERENCE_FIELDS ||
    path in WHOLE_ANSWERS ||
    path in REFERENCE_COLUMNS ||
    path === '/api/exports/quote.csv' ||
    USUAL_AT.test(path) ||
    ACTION_AT.test(path)
  );
}

/** The text of an answer without its figures of the network: what must not follow rows outside by a single byte. */
export function withoutReference(path: string, text: string): string {
  if (!mayRefer(path)) return text;
  const columns = REFERENCE_COLUMNS[path];
  if (columns) return withoutColumns(text, columns);
  // A quote as rows says in each where its cars were.
  if (path.endsWith('.csv')) return text.includes(',network,') ? 'of the network' : text;
  const answer: unknown = JSON.parse(text);
  // Nothing is lost between a text and what it says, so that equal sayings are equal bytes.
  if (JSON.stringify(answer) !== text) throw new Error(`${path} is not written as JSON writes it`);
  if (WHOLE_ANSWERS[path]?.(answer)) return 'of the network';
  if (USUAL_AT.test(path)) return JSON.stringify(withoutUsual(answer));
  const fields = ACTION_AT.test(path) ? EFFECT_FIELDS : (REFERENCE_FIELDS[path] ?? []);
  for (const field of fields) takeOut(answer, field);
  return JSON.stringify(answer);
}

/** No cell of these files holds a comma. */
function withoutColumns(text: string, columns: readonly string[]): string {
  const rows = text.split('\r\n').map((row) => row.split(','));
  const header = rows[0] ?? [];
  return rows
    .map((cells) => cells.filter((_, at) => !columns.includes(header[at] ?? '')).join())
    .join('\r\n');
}

function takeOut(value: unknown, [step = '', ...rest]: Path): void {
  if (typeof value !== 'object' || value === null) return;
  if (step === '*') {
    for (const item of Object.values(value)) takeOut(item, rest);
  } else if (rest.length > 0) {
    takeOut((value as Record<string, unknown>)[step], rest);
  } else {
    (value as Record<string, unknown>)[step] = 'of the network';
  }
}

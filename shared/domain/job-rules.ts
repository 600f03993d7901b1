import { isDate, isMonth } from './calendar';
import { CONDITIONS, type Condition } from './vocabulary';

export interface RuleBreak {
  /** JSON pointer into the job. */
  path: string;
  message: string;
}

/** What the rules need to know beyond the job itself. */
export interface JobWorld {
  /** The branch's local date (rule 9). */
  today: string;
  isProduct: (code: string) => boolean;
  isPackage: (code: string) => boolean;
  /** Set for a recorder: the amounts they leave out are those stored (rule 24). */
  money?: 'unseen';
}

/** The most that a line of a job may come to, in minor units: the limit of every amount (rule 55). */
const MOST_CENTS = 1_000_000_000;

/** What is said of an invoice whose total is neither sent nor stored. */
export const INVOICE_TOTAL_MISSING: RuleBreak = {
  path: '/invoice/totalCents',
  message: 'is required: the total before tax, in minor units',
};

type Loose = Record<string, unknown>;

/**
 * The rules that reach across fields and to other rows, over the raw body: wherever a field has not the right shape the rules
 * that need it are silent, so that these breaks and those of shape can be told together (rule 57).
 */
export function breaksOfJob(body: unknown, world: JobWorld): RuleBreak[] {
  if (!isObject(body)) return [];
  return [
    ...breaksOfDates(body, world.today),
    ...breaksOfReferences(body, world),
    ...breaksOfMoney(body, world),
    ...breaksOfFindings(body),
  ];
}

function breaksOfDates(job: Loose, today: string): RuleBreak[] {
  const breaks: RuleBreak[] = [];
  const invoice = isObject(job['invoice']) ? job['invoice'] : {};
  const extras = arrayOf(job['agreedExtras']);
  const dated: [string, unknown][] = [
    ['/bookedOn', job['bookedOn']],
    ['/startedOn', job['startedOn']],
    ['/completedOn', job['completedOn']],
    ['/invoice/issuedOn', invoice['issuedOn']],
    ...extras.map((extra, index): [string, unknown] => [
      `/agreedExtras/${index}/on`,
      isObject(extra) ? extra['on'] : undefined,
    ]),
  ];
  for (const [path, value] of dated) {
    const on = dateOrNothing(value);
    if (on !== undefined && on > today) {
      breaks.push({ path, message: `lies in the future (today is ${today} at this branch)` });
    }
  }
  const vehicle = isObject(job['vehicle']) ? job['vehicle'] : {};
  const registered = vehicle['firstRegistered'];
  if (typeof registered === 'string' && isMonth(registered)) {
    for (const [path, value] of dated) {
      const on = dateOrNothing(value);
      if (on !== undefined && on.slice(0, 7) < registered) {
        breaks.push({ path, message: `lies before first registration (${registered})` });
      }
    }
  }
  return [...breaks, ...breaksOfOrder(job)];
}

/** bookedOn ≤ startedOn ≤ completedOn, said at both fields of a broken pair, because either may be the wrong one. */
function breaksOfOrder(job: Loose): RuleBreak[] {
  const pairs = [
    ['bookedOn', 'startedOn'],
    ['startedOn', 'completedOn'],
    ['bookedOn', 'completedOn'],
  ] as const;
  return pairs.flatMap(([earlier, later]) => {
    const first = dateOrNothing(job[earlier]);
    const second = dateOrNothing(job[later]);
    if (first === undefined || second === undefined || first <= second) return [];
    return [
      { path: `/${earlier}`, message: `is after ${later} (${second})` },
      { path: `/${later}`, message: `is before ${earlier} (${first})` },
    ];
  });
}

/** What a job names that the catalogue does not have. */
export function breaksOfReferences(
  job: object,
  world: Pick<JobWorld, 'isProduct' | 'isPackage'>,
): RuleBreak[] {
  const { package: code, products }: Loose = { ...job };
  const breaks: RuleBreak[] = [];
  if (typeof code === 'string' && !world.isPackage(code)) {
    breaks.push({ path: '/package', message: `no package has the code ${quoted(code)}` });
  }
  arrayOf(products).forEach((line, index) => {
    const product = isObject(line) ? line['product'] : undefined;
    if (typeof product === 'string' && !world.isProduct(product)) {
      breaks.push({
        path: `/products/${index}/product`,
        message: `no product has the code ${quoted(product)}`,
      });
    }
  });
  return breaks;
}

function breaksOfMoney(job: Loose, { money }: JobWorld): RuleBreak[] {
  const breaks: RuleBreak[] = [];
  const { invoice } = job;
  if (money !== 'unseen' && isObject(invoice) && invoice['totalCents'] === undefined) {
    breaks.push(INVOICE_TOTAL_MISSING);
  }
  arrayOf(job['consumables']).forEach((line, index) => {
    if (!isObject(line)) return;
    const { quantity, unitCostCents } = line;
    if (typeof quantity !== 'number' || typeof unitCostCents !== 'number') return;
    // Several such lines would pass the whole numbers that a figure can hold exactly.
    if (quantity * unitCostCents > MOST_CENTS) {
      breaks.push({
        path: `/consumables/${index}/unitCostCents`,
        message: `the line comes to more than ${MOST_CENTS}`,
      });
    }
  });
  return breaks;
}

function breaksOfFindings(job: Loose): RuleBreak[] {
  const breaks: RuleBreak[] = [];
  const refs = new Set<string>();
  let repair = 0;
  arrayOf(job['findings']).forEach((finding, index) => {
    if (!isObject(finding)) return;
    const at = `/findings/${index}`;
    const { ref, seenAs, workedAs, action, repairMinutes } = finding;
    if (typeof ref === 'string') {
      const normal = ref.normalize('NFC');
      if (refs.has(normal)) {
        breaks.push({
          path: `${at}/ref`,
          message: `another finding of this job has the ref ${quoted(ref)}`,
        });
      }
      refs.add(normal);
    }
    if (isCondition(seenAs) && isCondition(workedAs) && gravity(workedAs) < gravity(seenAs)) {
      breaks.push({
        path: `${at}/workedAs`,
        message: `was seen as ${seenAs}; working it cannot make it ${workedAs}`,
      });
    }
    if (
      (action === 'patched' || action === 'treated') &&
      (workedAs === undefined || workedAs === null)
    ) {
      breaks.push({ path: `${at}/workedAs`, message: `is needed when the finding was ${action}` });
    }
    if (typeof repairMinutes === 'number') repair += repairMinutes;
  });
  return [...breaks, ...breaksOfRepair(job, repair)];
}

function breaksOfRepair(job: Loose, repair: number): RuleBreak[] {
  const actual = isObject(job['actual']) ? job['actual'] : undefined;
  const stages = actual && isObject(actual['stages']) ? actual['stages'] : undefined;
  if (!stages) return [];
  const stage = stages['repair'] ?? 0;
  if (typeof stage !== 'number' || repair <= stage) return [];
  const message = `the findings' repair minutes add to ${repair}, the repair stage has ${stage}`;
  return [
    { path: '/actual/stages/repair', message },
    { path: '/findings', message },
  ];
}

function dateOrNothing(value: unknown): string | undefined {
  return typeof value === 'string' && isDate(value) ? value : undefined;
}

function isObject(value: unknown): value is Loose {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function arrayOf(value: unknown): unknown[] {
  return Array.isArray(value) ? value : [];
}

function isCondition(value: unknown): value is Condition {
  return (CONDITIONS as readonly unknown[]).includes(value);
}

function gravity(condition: Condition): number {
  return CONDITIONS.indexOf(condition);
}

/** The text in quotes, shortened, so that a message stays one readable line. */
function quoted(text: string): string {
  return JSON.stringify(text.length > 40 ? `${text.slice(0, 40)}…` : text);
}

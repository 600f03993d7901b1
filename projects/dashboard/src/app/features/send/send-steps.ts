/** The steps of the form in working order, and the look over all of it at the end. */
export const SEND_STEPS = [
  'car',
  'package',
  'stages',
  'findings',
  'product',
  'invoice',
  'review',
] as const;
export type SendStep = (typeof SEND_STEPS)[number];

/** Steps that are filled in; the review is not one of them. */
export const FILLED_STEPS = SEND_STEPS.length - 1;

export const STEP_NAMES: Readonly<Record<SendStep, string>> = {
  car: 'car and job',
  package: 'package and estimate',
  stages: 'stages',
  findings: 'findings',
  product: 'product and checks',
  invoice: 'bill and notes',
  review: 'look it over',
};

/** As the button that leads there says it. */
export const NEXT_WORDS: Readonly<Record<SendStep, string>> = {
  car: 'car',
  package: 'package',
  stages: 'stages',
  findings: 'findings',
  product: 'product',
  invoice: 'bill',
  review: 'review',
};

/** The step of a name from the address, else the one of a number kept with the draft, else the first. */
export function stepOf(name: string | undefined, kept: number): SendStep {
  return SEND_STEPS.find((step) => step === name) ?? SEND_STEPS[kept] ?? 'car';
}

/** Where a step stands among those to fill in: "4 of 6, findings". */
export function stepWords(step: SendStep): string {
  const place = SEND_STEPS.indexOf(step);
  return place >= FILLED_STEPS
    ? `All ${FILLED_STEPS}, ${STEP_NAMES[step]}`
    : `${place + 1} of ${FILLED_STEPS}, ${STEP_NAMES[step]}`;
}

/** The step on which a field stands. */
export function stepOfPath(path: string): SendStep {
  if (path === '/findings') return 'findings';
  const [, first = '', second = ''] = path.split('/');
  switch (first) {
    case 'jobRef':
    case 'vehicle':
      return 'car';
    case 'package':
    case 'bookedOn':
    case 'startedOn':
    case 'completedOn':
    case 'estimate':
      return 'package';
    case 'actual':
    case 'agreedExtras':
    case 'timers':
      return 'stages';
    case 'findings':
      return 'findings';
    case 'products':
    case 'consumables':
    case 'checks':
    case 'workshop':
      return 'product';
    case 'invoice':
    case 'boughtInCents':
    case 'notes':
      return 'invoice';
    default:
      return second === '' ? 'review' : 'car';
  }
}

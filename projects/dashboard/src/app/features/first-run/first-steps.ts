/** What is known of a network that is being set up. */
export interface KnownSoFar {
  readonly feeSet: boolean;
  readonly regions: number;
  readonly branches: number;
  /** Branches whose hourly cost is known from some day on. */
  readonly branchesWithRate: number;
  readonly products: number;
  readonly productsWithCost: number;
  readonly packages: number;
  readonly norms: number;
  /** People besides head office. */
  readonly others: number;
  readonly jobs: number;
}

export const STEP_KEYS = [
  'network',
  'region',
  'branch',
  'products',
  'package',
  'people',
  'job',
] as const;
export type StepKey = (typeof STEP_KEYS)[number];

/** One step from nothing to the first job. */
export interface FirstStep {
  readonly key: StepKey;
  readonly name: string;
  /** Why it is asked. */
  readonly why: string;
  /** What works without it, or what does not. */
  readonly without: string;
  readonly need: 'needed' | 'can wait';
  readonly done: boolean;
}

/** The steps in their order, each with whether the data show it done. */
export function firstSteps(known: KnownSoFar): readonly FirstStep[] {
  return [
    {
      key: 'network',
      name: 'The network',
      why: 'Amounts need a currency, and what a bill keeps depends on the network’s fee.',
      without: 'Without it cars can be sent, but no margin can be worked out.',
      need: 'needed',
      done: known.feeSet,
    },
    {
      key: 'region',
      name: 'A region',
      why: 'Branches lie in regions, so that coast and inland can be told apart.',
      without: 'Its climate can wait: it only adds how corrosive the air is.',
      need: 'needed',
      done: known.regions > 0,
    },
    {
      key: 'branch',
      name: 'The first branch',
      why: 'Every car is finished in a branch, and its hours cost what they cost there.',
      without: 'Without the hourly cost cars can be sent, but show no margin.',
      need: 'needed',
      done: known.branches > 0 && known.branchesWithRate > 0,
    },
    {
      key: 'products',
      name: 'Products',
      why: 'A job lists what went in by the code of the product, and its cost makes the margin.',
      without: 'Without them a job can list no product.',
      need: 'needed',
      done: known.products > 0 && known.productsWithCost > 0,
    },
    {
      key: 'package',
      name: 'A package',
      why: 'Every job says which package was sold, and the package says how long its warranty runs.',
      without: 'Norms can wait: without one, expected margin and product use stay open.',
      need: 'needed',
      done: known.packages > 0,
    },
    {
      key: 'people',
      name: 'People',
      why: 'A site manager reads the branch’s week, a recorder sends its cars.',
      without: 'You can send the first car yourself.',
      need: 'can wait',
      done: known.others > 0,
    },
    {
      key: 'job',
      name: 'The first job',
      why: 'One finished car, and the pages have something to say.',
      without: 'Until then they say what to do next.',
      need: 'needed',
      done: known.jobs > 0,
    },
  ];
}

/** The step to begin at: the first that is needed and not done, else the last. */
export function firstOpen(steps: readonly FirstStep[]): StepKey {
  return steps.find(({ done, need }) => !done && need === 'needed')?.key ?? 'job';
}

/** The step after one, if there is any. */
export function stepAfter(steps: readonly FirstStep[], key: StepKey): FirstStep | undefined {
  return steps[steps.findIndex((step) => step.key === key) + 1];
}

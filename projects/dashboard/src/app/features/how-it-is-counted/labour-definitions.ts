import { type Definition, OWN } from './definition';

/** Labour overrun: ratio, interval, quantiles, allowance, and the groups it is read by. */
export const labourDefinitions: readonly Definition[] = [
  {
    id: 'overrun',
    title: 'Overrun',
    means:
      'How much longer a set of cars took than was estimated: +23 % means 123 minutes worked for every 100 estimated. Minutes are summed first, so that a long job weighs more than a short one.',
    formula: ['ratio = Σ actual minutes ÷ Σ estimated minutes; overrun = ratio − 1'],
    leftOut: 'Cars without an estimate, or with one of 0 minutes in total; they are counted apart.',
    source: OWN,
  },
  {
    id: 'overrun-interval',
    title: 'Interval of an overrun',
    means:
      'Chance makes one set of cars slower than the next. A range made this way holds the lasting overrun of such cars 95 times of 100. A group stands above or below only when its whole interval misses the line it is compared with.',
    formula: [
      's.e. = √( Σ (actual − ratio × estimate)² ÷ (n (n − 1)) ) ÷ mean estimate',
      'interval = ratio ± 1.96 × s.e.',
    ],
    leftOut: 'No correction for the set being a part of a finite whole.',
    source:
      'Ratio estimator: W. G. Cochran, Sampling Techniques, 3rd ed. 1977, chapter 6. 1.96 is the normal quantile of 97.5 %.',
  },
  {
    id: 'overrun-minutes',
    title: 'Minutes over, by stage',
    means:
      'Actual minus estimated minutes of every stage. The seven stages add up to the whole overrun, so they say where the time went.',
    leftOut:
      'A stage that no estimate names has minutes over but no ratio. A stage’s quantiles come from the cars whose estimate names it.',
    source: OWN,
  },
  {
    id: 'quantiles',
    title: 'Half, 8 of 10, 19 of 20',
    means:
      'Single cars, not sums: half of the cars stayed within the first ratio of actual to estimated minutes, 8 of 10 within the second, 19 of 20 within the third.',
    formula: [
      'median, 80 % and 95 % quantile of the cars’ ratios, interpolated between neighbours',
    ],
    source:
      'R. J. Hyndman and Y. Fan, Sample quantiles in statistical packages, The American Statistician 50, 1996, type 7.',
  },
  {
    id: 'allowance',
    title: 'Allowance',
    means:
      'What to add to the estimate of such a car so that 8 of 10 would have been done within it. Below 0 when the estimates are longer than they need be.',
    formula: ['allowance = 80 % quantile of the cars’ ratios − 1'],
    source: OWN,
  },
  {
    id: 'without-estimate',
    title: 'Cars without an estimate',
    means: 'They are counted and shown as a number, and stand in no ratio.',
    formula: ['cars with an estimate + cars without = all cars of the dates'],
    source: OWN,
  },
  {
    id: 'age-band',
    title: 'Age of a car',
    means:
      'Whole years from first registration to completion, by calendar months, in bands 0–4, 5–9, 10–14, 15–19, 20 and over.',
    formula: ['years = ⌊(completion month − registration month) ÷ 12⌋'],
    source: OWN,
  },
  {
    id: 'rot',
    title: 'Rot found',
    means:
      'A car has rot when any finding was seen or worked as bubbling or holed. Surface rust alone is not rot; a car without findings has none.',
    source: OWN,
  },
];

import { type Definition, OWN } from './definition';

/** What was left on cars. */
export const comeBackDefinitions: readonly Definition[] = [
  {
    id: 'come-back',
    title: 'Findings still on cars',
    means:
      'Findings that were deferred or declined and are still open, contacted or booked. They come in the order of their danger: load-bearing and holed, load-bearing, holed, the rest; then the longest wait first.',
    formula: ['findings deferred or declined − those done, gone, or dealt with by a later job'],
    leftOut:
      'A later job of the same car (the branch’s own key) takes a finding off the list only where it records the same zone and side as treated or patched; when that job is voided the finding is back. Without dates chosen, cars of all dates count.',
    source: OWN,
  },
  {
    id: 'dangerous',
    title: 'Dangerous',
    means:
      'Rot, bubbling or holed, left on a car in a place that bears load there: near a seat-belt anchorage, suspension, subframe, steering, a jacking point or a sill’s mounting. Its owner is to be told in writing; the day of that is asked for. The product informs, it does not certify: the local inspection rules decide.',
    leftOut:
      'Findings that were treated or patched; places that bear no load; surface rust, which is listed but no rot yet.',
    source: 'Common practice, no source.',
  },
  {
    id: 'come-back-wait',
    title: 'How long a finding has been on its car',
    means:
      'Whole weeks from the day the car left to today. Half of a group’s findings have waited longer than its middle.',
    formula: ['weeks = ⌊(today − completed on) / 7⌋'],
    leftOut: 'With fewer than 5 cars in a group no middle is said.',
    source: OWN,
  },
];

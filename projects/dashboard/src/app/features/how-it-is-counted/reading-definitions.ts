import { type Definition, OWN } from './definition';

/** What counts at all, where it counts, and how figures are shown. */
export const readingDefinitions: readonly Definition[] = [
  {
    id: 'jobs-counted',
    title: 'Which cars count',
    means:
      'Every job by the day it was completed, a local date of its branch. Minutes, product and findings follow their job.',
    leftOut:
      'Voided jobs, and earlier revisions of a corrected one. A job from a closed branch stays in; a branch that changed its region is counted with the region it has now.',
    source: OWN,
  },
  {
    id: 'weeks',
    title: 'Weeks and dates',
    means:
      'Weeks run from Monday to Sunday; week 1 is the one with the year’s first Thursday. Dates chosen are both included. Today is the latest local date among the branches in view. A week that the dates cut, or that is not over, shows what it has and is not judged.',
    source: 'Weeks: ISO 8601-1:2019.',
  },
  {
    id: 'scope',
    title: 'Whose cars you see',
    means:
      'Recorders and site managers see their branches, regional leads the branches of their regions, head office the network. Every figure counts only those, narrowed by the line above the page.',
    leftOut:
      'A branch, region or job outside is answered as if it did not exist. A figure of the whole network is shown as a reference only where at least 5 other branches are behind it, and never with a branch’s name; else the reference is what you see yourself.',
    source: OWN,
  },
  {
    id: 'small-samples',
    title: 'Too few cars yet',
    means:
      'With fewer than 5 cars no share, ratio, quantile or interval is shown; the number of cars is. Sums of money, and the share a week kept, are always shown with their cars.',
    source: OWN,
  },
  {
    id: 'digits',
    title: 'Digits shown',
    means:
      'Figures are computed unrounded and shown with no more digits than their interval supports. One more digit appears where whole per cent would read as a contradiction. Files hold the unrounded figures.',
    source: OWN,
  },
];

import { type Definition, OWN } from './definition';

/** Noticing in time, and what was agreed: signals, how often they are wrong, the measure of an action before and after. */
export const signalDefinitions: readonly Definition[] = [
  {
    id: 'signals',
    title: 'Signals',
    means:
      'What a nightly look finds worth a look by a person, each with since when, how strong and the cars behind it. It stays one signal for as long as it is found, can be acknowledged with a note, and is over by itself when it is found no more. What can hurt somebody comes first. A signal asks a question; it says nothing about blame.',
    formula: [
      'dangerous rot past its day: rot left where the car bears load, still open, its set day gone by',
      'no jobs arriving: more quiet days, of those on which the branch usually sends, than the longest gap of its last 400 days; at least 5, and the usual gap is taken as 15 at most, or twice the middle one',
      'values look wrong, in the last 91 days: a stage of 20 hours or more, 40 litres or more of one product, a price or bill of nothing; or the newest 20 cars or more all took exactly their estimate in every stage',
      'unbilled: finished more than 14 days ago, and no bill',
      'week outside, run of eight: as the weekly chart marks them, of the last whole billed week',
      'left the funnel: beyond the 99.8 % limits over the last 52 weeks; over when back within the 95 % ones',
      'labour drifting up: cumulative sum of weekly minutes beyond what the same cars took at that branch in the 52 weeks before, in spreads of such a week; half a spread is allowed each week, and beyond 6 it is told; over at half of that',
      'claims coming faster: cumulative sum of log-likelihoods of twice as many claims as usual against as many, 52 weeks judged by the 104 before; beyond 4.5 it is told, with at least 5 claims; over at half of that',
    ],
    leftOut:
      'Closed branches have no silence; branches with fewer than 20 days of jobs have no habit yet. Labour that drifts down and claims that come more slowly. Weeks older than 35 days are no news. Days on which no look was made are not made up: what still is will be found at the next.',
    source:
      'Cumulative sums: NIST/SEMATECH e-Handbook of Statistical Methods, 6.3.2.3; of counts: J. M. Lucas, Counted data CUSUM’s, Technometrics 27, 1985, 129–144. Weeks and funnel as told there. 14 days, 20 hours, 40 litres and the other bounds are this product’s own.',
  },
  {
    id: 'false-alarms',
    title: 'False alarms',
    means:
      'How often a signal is told though nothing has changed. Limits are drawn so that this is rare, but with many branches and every week something will stand out by chance: of a funnel’s points, one of 500 at 99.8 %. On a network made up without any change a branch saw one about every 15 months: a week outside 0.44 times a year, labour drifting 0.15, a run of eight 0.13, claims drifting 0.10. Labour that climbs by a fifth over half a year is noticed after 16 weeks, claims at 2.3 times the usual after 26, in half of such branches.',
    formula: [
      'measured: signals opened ÷ branch-years looked at, on a made-up network in which nothing changes',
    ],
    leftOut:
      'Signals that say what is so, as unbilled cars or a day gone by: they are no question of chance.',
    source: OWN,
  },
  {
    id: 'action-effect',
    title: 'Before and after',
    means:
      'The measure that an action watches, in the half-year before it was agreed and since then, half a year at most. Both sides are held against what such cars lead one to expect, so that other cars than before are no effect. An interval that holds 0 says that chance alone may have done it. Before and after is no proof: what else changed at that time is in it too.',
    formula: [
      'change = (value − expected) after − (value − expected) before, one set of rates for both',
      'interval of a side, 95 %: Wilson for rot, exact for claims, the ratio’s standard error for the others; of the change, from both',
    ],
    leftOut:
      'A side with fewer than 5 cars is not told, and no change then. Of claims the days under warranty and the claims made on each side count, whenever the cars were finished.',
    source:
      'R. G. Newcombe, Statistics in Medicine 17, 1998, 873–890, method 10; G. Y. Zou and A. Donner, Statistics in Medicine 27, 2008, 1693–1702.',
  },
];

import type { Definition } from './definition';

/** The weekly chart: limits, signals, trend. */
export const weeklyDefinitions: readonly Definition[] = [
  {
    id: 'weekly-chart',
    title: 'Usual range: centre and limits',
    means:
      'What a week of this scope keeps when nothing special happens, read from its own earlier weeks. A week inside the limits is no better or worse than chance explains; do not ask it for reasons.',
    formula: [
      'centre = mean of the shares kept of the up to 26 billed weeks before the last billed week shown',
      'mean moving range = mean of |difference| between neighbouring billed weeks of these',
      'limits = centre ± 3 ÷ 1.128 × mean moving range',
    ],
    leftOut:
      'Weeks with nothing billed (the neighbours are then the billed weeks on either side), weeks cut by the dates, and the week that is not over. With fewer than 8 earlier billed weeks there are no limits. Limits may lie below 0 or above 100 %.',
    source:
      'Individuals and moving-range chart: W. A. Shewhart, Economic Control of Quality of Manufactured Product, 1931; D. J. Wheeler and D. S. Chambers, Understanding Statistical Process Control, 2nd ed. 1992. 1.128 is d₂ for ranges of two, 2/√π (ISO 7870-2:2013). The span of 26 weeks and the least of 8 are this product’s own.',
  },
  {
    id: 'marked-weeks',
    title: 'Marked weeks',
    means:
      'A diamond: the week lies beyond a limit, and a reason is worth looking for. A triangle: at least the 8th billed week running on one side of the centre; something has shifted.',
    formula: [
      'outside: strictly beyond a limit',
      'run: 8 or more billed weeks in a row strictly on one side, counted from the first week shown',
      'a week that is both is marked as outside',
    ],
    leftOut: 'A week exactly on the centre ends a run. Weeks with nothing billed are skipped.',
    source:
      'One point beyond three sigma: Shewhart 1931. Eight in a row on one side: Western Electric Company, Statistical Quality Control Handbook, 1956.',
  },
  {
    id: 'trend',
    title: 'Trend',
    means:
      'Whether the share kept has been rising or falling over the weeks shown. It is called a trend only when chance would produce one like it in fewer than 5 of 100 cases; p is that chance.',
    formula: [
      'slope = median of the slopes between all pairs of billed weeks, in points a week',
      'p: two-sided, tie-corrected, with continuity correction',
    ],
    leftOut: 'Weeks cut by the dates or not over; fewer than 8 billed weeks give no trend.',
    source:
      'P. K. Sen, Journal of the American Statistical Association 63, 1968, after H. Theil, 1950; H. B. Mann, Econometrica 13, 1945; M. G. Kendall, Rank Correlation Methods, 1948. The line at 5 of 100 is convention.',
  },
];

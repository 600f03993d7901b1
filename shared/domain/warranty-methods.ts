/** How one figure of the warranty report comes about, in plain words, with what was published of the method. */
export interface MethodNote {
  readonly name: string;
  readonly words: string;
  /** Published sources; none for what is settled here or is common practice. */
  readonly sources: readonly string[];
}

const GARWOOD =
  'F. Garwood, Fiducial limits for the Poisson distribution, Biometrika 28 (1936) 437–442';

/** The methods of the warranty report in the order of its parts, so that page and PDF say the same. */
export const WARRANTY_METHODS: readonly MethodNote[] = [
  {
    name: 'What counts',
    words:
      'A claim counts when it was made by the as-of day and within its car’s warranty, and was not refused by then; claims still open count. Jobs that are void are in nothing. The as-of day cuts by the dates of things, so a correction received later is used as it stands when the report is made.',
    sources: [],
  },
  {
    name: 'Cover',
    words:
      'A warranty runs from the day after the car was finished to the same day of the month in which it ends, or that month’s last day. Car-years run are the days of cover up to the as-of day, divided by 365.25; a claim does not end them. Car-years left are the days of cover after it.',
    sources: [],
  },
  {
    name: 'Rate of claims',
    words:
      'Claims per 1,000 car-years run, with the exact 95 % interval of a count of rare events.',
    sources: [GARWOOD],
  },
  {
    name: 'Cars still without a claim',
    words:
      'By months since the car was finished: a car is at risk until its first claim, or until its warranty or the as-of day ends what can be seen of it. The share is the product-limit estimate with Greenwood’s error and a 95 % interval on the log-log scale; no share is given for a month with fewer than 5 cars at risk. Groups are compared by the log-rank test.',
    sources: [
      'E. L. Kaplan and P. Meier, Nonparametric estimation from incomplete observations, Journal of the American Statistical Association 53 (1958) 457–481',
      'M. Greenwood, The natural duration of cancer, Reports on Public Health and Medical Subjects 33 (1926)',
    ],
  },
  {
    name: 'Paid and still to come',
    words:
      'What was paid is added up by the half-year in which cars were finished and the half-year in which it was paid, up to the last 30 June or 31 December that is not after the as-of day. Younger half-years are carried forward as older ones went (chain ladder): each factor is the sum paid up to one half-year of age over the sum paid up to the half-year before, of the same cars. Nothing is added beyond the oldest age seen, so what comes later still is not in the figure. Give or take is 1.96 times the standard error. A branch’s part is what it paid times what the network’s cars of that half-year have still to come for each unit paid, so that branches add up to the network.',
    sources: [
      'T. Mack, Distribution-free calculation of the standard error of chain ladder reserve estimates, ASTIN Bulletin 23 (1993) 213–225',
    ],
  },
  {
    name: 'Claims against expected',
    words:
      'Expected claims are the whole network’s claims per car-year, by package, age of the car when finished and year in service, on the branch’s own car-years (indirect standardisation, common practice). The ratio has the exact 95 % interval of its count. A branch stands above or below where that whole interval misses 1, and is as expected otherwise. Branches stand in the order of their codes: a ratio is no rank.',
    sources: [GARWOOD],
  },
  {
    name: 'Process checks',
    words:
      'Of cars with 24 months of warranty or more that were finished at least 24 months before the as-of day: how many times as likely a claim within 24 months is where a check was missed as where it was done, pooled over age bands, with its 95 % interval. Thin product compares cars that got under 70 % of their norm with those that did not. Such a ratio says where to look; it does not prove the cause.',
    sources: [
      'N. Mantel and W. Haenszel, Statistical aspects of the analysis of data from retrospective studies of disease, Journal of the National Cancer Institute 22 (1959) 719–748',
      'S. Greenland and J. M. Robins, Estimation of a common effect parameter from sparse follow-up data, Biometrics 41 (1985) 55–68',
    ],
  },
];

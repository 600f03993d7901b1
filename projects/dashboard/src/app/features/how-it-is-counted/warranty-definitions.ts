import { type Definition, OWN } from './definition';

const GARWOOD = 'F. Garwood, Biometrika 28, 1936, 437–442';

/** Claims and what they will cost: rate, curves, money still to come, branches against expected, checks, the report. */
export const warrantyDefinitions: readonly Definition[] = [
  {
    id: 'claims-counted',
    title: 'Claims that count, as of a day',
    means:
      'A claim counts when it was made by that day, within the warranty of its car, and had not been refused by then. A claim not yet decided counts. The day cuts by the dates of things, not by when they were sent in, so that a past day can be looked at with all that is known of it now.',
    formula: [
      'made ≤ the day, made ≤ end of the warranty, not refused by the day',
      'end of the warranty = completion + its months, or the last day of a month that is shorter; that day is covered',
    ],
    leftOut: 'Claims on voided jobs, until the job is restored.',
    source: OWN,
  },
  {
    id: 'claim-rate',
    title: 'Claims per 1,000 car-years',
    means:
      'How many claims came in the time for which cars have been under warranty: a thousand cars under warranty for a year, or five hundred for two, are 1,000 car-years. The interval is the exact one of a count: chance alone brings more claims in one year than in the next.',
    formula: [
      'car-years of a car = days from completion to the day or the end of its warranty, whichever comes first ÷ 365.25; a claim does not end them',
      'rate = 1,000 × claims that count ÷ car-years; limits of the count ÷ the same car-years',
    ],
    leftOut: 'Cars sold without a warranty. Without a car-year there is no rate.',
    source: `Exact Poisson limits: ${GARWOOD}.`,
  },
  {
    id: 'claim-free',
    title: 'Cars still without a claim',
    means:
      'Of cars so many months after completion, the share on which no claim has been made. Cars finished lately have few months behind them: each counts as long as it can be seen, and leaves without a claim when its warranty or the day ends that.',
    formula: [
      'each month: share so far × (1 − first claims ÷ cars at risk)',
      'interval: Greenwood’s standard error, on the log-log scale, 95 %',
    ],
    leftOut:
      'Second and later claims of a car. Months with fewer than 5 cars at risk have no share; before the first claim there is no interval.',
    source:
      'E. L. Kaplan and P. Meier, JASA 53, 1958, 457–481; limits as in J. D. Kalbfleisch and R. L. Prentice, 1980.',
  },
  {
    id: 'log-rank',
    title: 'Whether curves differ',
    means:
      'If all groups shown were alike, how likely it is that their claims would come as unevenly as they did, or more so. Below 0.05 the difference is more than chance usually makes. It does not say why: groups may differ in the age of their cars.',
    formula: [
      'each month: first claims of all groups, shared out by cars at risk, are the expected ones',
      'χ² of observed − expected, groups less one degrees of freedom, no continuity correction',
    ],
    leftOut: 'With fewer than two groups, or no claim, there is nothing to compare.',
    source: 'N. Mantel, Cancer Chemotherapy Reports 50, 1966, 163–170.',
  },
  {
    id: 'still-to-come',
    title: 'Still to come',
    means:
      'What the warranties sold so far should still cost. Cars are set out by the half-year they were finished in and payments by the half-year they were made in; younger half-years are carried on as older ones went. “Give or take” is 1.96 standard errors: about 19 times of 20 the cost should end within it, if the years to come are like those behind.',
    formula: [
      'factor of an age = Σ paid up to the next age ÷ Σ paid up to this one, over the half-years that have both',
      'ultimate = paid so far × the factors still ahead; still to come = ultimate − paid so far',
      'standard error by Mack; the last variance is the least of the two before it and of their ratio',
    ],
    leftOut:
      'Payments after the last 30 June or 31 December that is over. Whatever is paid at an age that no half-year has reached yet: there is no tail. With fewer than four half-years, or a column with too little paid in it, there is no standard error. Nothing is carried on for a half-year that is not over.',
    source:
      'T. Mack, Distribution-free calculation of the standard error of chain ladder reserve estimates, ASTIN Bulletin 23, 1993, 213–225.',
  },
  {
    id: 'against-expected',
    title: 'Claims against expected',
    means:
      'Whether a branch, or the cars of a half-year, have more claims than such cars have elsewhere. A ratio of 1.5 means three claims for every two expected. Above or below is said only where the whole interval misses 1; a ratio is no rank. Where too few other branches stand behind the network, the rates are those of all the branches you see, and the page says so.',
    formula: [
      'rate = claims ÷ car-years of the reference, by package, age of the car and year after completion',
      'expected = Σ own car-years × rate; ratio = claims ÷ expected; exact limits of the claims ÷ expected',
    ],
    leftOut:
      'The seasons: claims come more in winter, so cars that have only lived through one may stand above or below for that alone. Where nothing is expected there is no ratio.',
    source: `Indirect standardisation, common practice. Interval: ${GARWOOD}.`,
  },
  {
    id: 'process-risk',
    title: 'Missed against done',
    means:
      'How many times as likely a claim within 24 months is on cars where a check was missed as where it was done. Cars are compared within their band of age, and the bands are pooled. That two things go together does not say that one brings about the other, but it says where to look first.',
    formula: [
      'ratio = Σ missed with a claim × done ÷ all, over Σ done with a claim × missed ÷ all, a term for each band',
      '95 % interval of its logarithm by Greenland and Robins',
    ],
    leftOut:
      'Cars finished less than 24 months before the day, or with a shorter warranty; checks that do not apply or were not answered. No ratio where either side has no claim.',
    source:
      'N. Mantel and W. Haenszel, J. Natl. Cancer Inst. 22, 1959, 719–748; S. Greenland and J. M. Robins, Biometrics 41, 1985, 55–68.',
  },
  {
    id: 'thin-product',
    title: 'Thin product and claims',
    means:
      'The same comparison for cars that got under 70 % of their norm, all products with a norm together, against those that got more.',
    formula: ['thin: Σ ml < 0.7 × Σ norm ml over the products with a norm'],
    leftOut: 'Cars without a norm. Norms carry no date: today’s are applied to the past.',
    source: 'As for the checks; the 70 % is this product’s own.',
  },
  {
    id: 'warranty-report',
    title: 'Warranty-risk report',
    means:
      'What head office can show an auditor: a row for each branch and half-year of completion, as of a day. The same day and the same data give the same bytes. An issued report is kept as it was, and what arrived later for its period is listed beside it.',
    formula: [
      'cars covered: sold with a warranty; car-years left = Σ days of cover after the day ÷ 365.25',
      'still to come of a branch = its paid × (ultimate ÷ paid − 1) of the network’s half-year, so that branches add up to the network',
      'its standard error: Mack’s for one row with the network’s factors; rows share them, so errors do not add',
      'claims open: claims that count and were not decided on the day',
    ],
    leftOut: 'What each of its figures leaves out, as told above.',
    source: OWN,
  },
  {
    id: 'warranty-left-out',
    title: 'What is not included',
    means:
      'What stands outside the figures is counted beside them, so that nobody has to guess: cars sold without a warranty, claims made after its end, claims refused, claims that wait for head office, and what was paid after the last half-year that is over.',
    formula: [
      'a claim that is both refused and late is counted as refused',
      'a claim that waits for head office counts, as not decided, until the decision is sent',
    ],
    leftOut:
      'Whatever nobody has sent in: a claim that was settled at the counter is in no figure.',
    source: OWN,
  },
];

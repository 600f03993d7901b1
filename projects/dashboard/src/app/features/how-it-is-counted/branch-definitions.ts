import { type Definition, OWN } from './definition';

/** Comparing branches fairly: the funnel, what sets branches apart, their weeks, how far their records reach. */
export const branchDefinitions: readonly Definition[] = [
  {
    id: 'funnel',
    title: 'Funnel',
    means:
      'Each branch as a point over its number of cars, with limits around what the network has on cars of the same ages and packages. Few cars swing widely by chance, many do not: so the limits narrow to the right. Between the 95 % limits a branch is as expected, whatever its rank; beyond them one branch of 20 would stand by chance alone; beyond the 99.8 % limits one of 500. Where too few other branches stand behind the network, all the branches you see take its place, and the page says so.',
    formula: [
      'value = what is counted ÷ what it is counted by, as it stands: minutes ÷ estimated minutes, cars with rot ÷ cars, claims ÷ 1,000 car-years, ml ÷ norm ml, margin ÷ revenue',
      'expected = Σ rate of the network for age band and package × the branch’s own share of such work',
      'rot: exact limits of a share of so many cars; claims: those of a count about its mean; both interpolated between whole numbers',
      'overrun, product, margin: expected ± z × s × √cars ÷ Σ what it is counted by, z 1.959964 and 3.090232, s the spread of single cars about their rates',
      'above or below is strictly beyond a limit; the wider limits are told first',
    ],
    leftOut:
      'Below 5 cars a branch has too few cars: its count stands, and of margin and claims its value, without limits. Cars without an estimate (overrun), without a norm (product), without a bill or a known cost (margin), without a warranty (claims). What sets branches apart beyond age band and package, as the models or the air, is not allowed for.',
    source:
      'D. J. Spiegelhalter, Funnel plots for comparing institutional performance, Statistics in Medicine 24, 2005, 1185–1202. Expected values: indirect standardisation, common practice. Five cars are this product’s own.',
  },
  {
    id: 'side-by-side',
    title: 'What sets branches apart',
    means:
      'The way from the network’s figure to a branch’s, in steps that add up. The first, the mix of cars, is what the branch’s ages and packages alone would bring; it is no merit and no fault. Each other step is one part of the figure, a stage of labour, an age band of cars with rot, a cause of claims, a product or a line of cost, beyond what such cars have in the network.',
    formula: [
      'mix of cars = expected − the network’s value',
      'each part = its share of the value − its share of the expected value',
      'the network’s value + all steps = the branch’s value',
    ],
    leftOut:
      'A branch with too few cars has no steps. A single step carries no limits: a branch as expected may show large steps that cancel, or steps of chance.',
    source: 'Indirect standardisation, common practice. The steps are this product’s own.',
  },
  {
    id: 'branch-weeks',
    title: 'Weeks of a branch',
    means:
      'Small pictures of each branch, week by week, all to one scale. The lines are the usual range of that branch itself, not of the network: a branch may be steady and dear, or cheap and drifting.',
    formula: [
      'centre and limits as in the weekly chart, from up to 26 earlier weeks of the branch',
      'claims: how many of those that count were made in the week, whenever their cars were finished',
    ],
    leftOut:
      'Weeks with fewer than 5 cars have no value, of margin and claims excepted. Fewer than 8 earlier weeks give no range, and counts of claims never have one.',
    source: 'As for the weekly chart.',
  },
  {
    id: 'received-through',
    title: 'Received through',
    means:
      'The newest day on which the branch finished a car, of all the jobs that have come in, whatever was asked for. What stands after that day is not known to be nothing: it may only not have been sent.',
    formula: ['newest day of completion among its jobs, and when anything of it last came in'],
    leftOut: 'Voided jobs. Whether days before it are complete cannot be told from the jobs.',
    source: OWN,
  },
  {
    id: 'targets',
    title: 'Targets',
    means:
      'What is aimed at: labour against estimate, product against norm, claims per 1,000 car-years, the share kept. Head office sets them for the network, a lead for a branch. A target is a wish and is drawn as its own line; the limits say what happens by itself. A branch may miss its target and still be as expected, and the other way round.',
    formula: ['of a branch: its own, or else the network’s; of several together: the network’s'],
    leftOut:
      'Rot, which cars bring along and nobody can aim at. No limit, word or signal depends on a target.',
    source: OWN,
  },
];

import { type Definition, OWN } from './definition';

const WILSON =
  'Interval: E. B. Wilson, JASA 22, 1927, 209–212; R. G. Newcombe, Statistics in Medicine 17, 1998, 857–872, method 3.';

/** Rot: shares by age, place and region, the age adjustment, the models steadied, bubbles that opened, and the air. */
export const rotDefinitions: readonly Definition[] = [
  {
    id: 'rot-share',
    title: 'Share of cars with rot',
    means:
      'Of the cars of one age, how many had rot: in a region, or anywhere. The range is the Wilson interval: chance makes one set of cars worse than the next, and a range made this way holds the lasting share about 95 times of 100.',
    formula: ['share = cars with rot ÷ cars; a car counts once, however much rot it has'],
    leftOut: 'Surface rust alone. With fewer than 5 cars only the counts are shown.',
    source: WILSON,
  },
  {
    id: 'rot-zones',
    title: 'Where the rot was',
    means:
      'Of all cars of one age, how many had rot in one zone on one side. Rot on both sides counts once on each, so that the shares of zones and sides do not add up to the share of cars.',
    formula: [
      'share = cars with rot in the place ÷ all cars of the age',
      'steps of the shading: 0, 2.5, 5, 10, 20, 40 %, by the unrounded share, the same for all ages',
    ],
    leftOut: 'Whether somebody looked at the place: what a job does not list counts as not found.',
    source: WILSON,
  },
  {
    id: 'rot-adjusted',
    title: 'Share adjusted for age',
    means:
      'A region with older cars has more rot for that alone. Adjusted, every region is given the same ages, those of the whole network in these dates, so that regions can be compared. Where too few other branches stand behind a figure of the network, the ages are those of all the branches you see, whichever are chosen above; the page says which.',
    formula: [
      'adjusted = Σ weight of an age × share of that age in the region; weight = the reference’s part of its cars in that age',
      'interval: gamma limits of Fay and Feuer, never above 100 %',
    ],
    leftOut:
      'Ages in which the region has no car, which are named; the other weights are stretched to fill. Regions with fewer than 5 cars.',
    source:
      'Direct standardisation. Interval: M. P. Fay and E. J. Feuer, Statistics in Medicine 16, 1997, 791–801.',
  },
  {
    id: 'rot-models',
    title: 'Models: as counted and steadied',
    means:
      'As counted is the plain share, which jumps about where a model has few cars. Steadied, it is drawn towards all models of the age, the more the fewer its cars: a beta-binomial distribution is fitted to the models of that age, and each model’s share is what that and its own cars say together. The line is the range that holds it with 95 %.',
    formula: [
      'α, β: largest likelihood over the models of the age',
      'steadied = (α + cars with rot) ÷ (α + β + cars); range: 2.5 % and 97.5 % of that beta distribution',
    ],
    leftOut:
      'Where models differ no more than chance alone would make them there is nothing to tell them apart by: each is given the share of all with its Wilson interval, and the page says so. Makes and models are taken as equal whatever their capitals and spaces.',
    source:
      'Beta-binomial model, as in A. Gelman et al., Bayesian Data Analysis, 3rd ed. 2013, section 5.1.',
  },
  {
    id: 'opened-up',
    title: 'Bubbles that opened into holes',
    means:
      'How often a bubble turns out to be a hole once somebody works on it. Counted in findings, over all ages shown.',
    formula: [
      'share = findings seen as bubbling and worked as holed ÷ findings seen as bubbling and worked',
    ],
    leftOut: 'Bubbles that nobody worked on. With fewer than 5 findings only the counts are shown.',
    source: WILSON,
  },
  {
    id: 'corrosivity',
    title: 'What the air of a region does',
    means:
      'How much bare carbon steel would lose in its first year in the open air of the region, in thousandths of a millimetre, and the category of that: C1 (very low) to CX (extreme). It is worked out from yearly means of temperature, humidity, and what settles of sulphur dioxide and of sea salt.',
    formula: ['dose-response function of ISO 9223 for carbon steel; categories by its rate'],
    leftOut:
      'Road salt, for which the formula has no term. A region without a climate has none. Where a mean lies outside the range the formula was fitted on, the page says so.',
    source: 'ISO 9223:2012, read in secondary sources.',
  },
  {
    id: 'network-reference',
    title: 'Network, as a reference',
    means:
      'The same share over the whole network, or, where fewer than 5 other branches stand behind that, over all the branches you see. It never tells of a single branch.',
    source: OWN,
  },
];

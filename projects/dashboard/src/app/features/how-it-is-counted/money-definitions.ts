import { type Definition, OWN } from './definition';

/** Margin, its lines, what was expected, and what stands outside. */
export const moneyDefinitions: readonly Definition[] = [
  {
    id: 'margin',
    title: 'Margin, and the share kept',
    means:
      'What is left of a bill after everything the car took. The share kept is the margin of a set of cars over what they were billed, both summed first: large bills weigh more than small ones.',
    formula: [
      'margin = revenue − labour − product − consumables − bought-in − network fee',
      'share kept = Σ margin ÷ Σ revenue; none where nothing was billed',
    ],
    leftOut:
      'Cars without a bill stand outside every margin; what they have cost so far is shown beside. Cars with a cost that is not known are left out of the money and counted apart.',
    source: OWN,
  },
  {
    id: 'revenue',
    title: 'Revenue (billed)',
    means: 'The total of the bill before tax, as the branch sent it.',
    leftOut: 'The date of the bill decides nothing: a car counts on the day it was finished.',
    source: OWN,
  },
  {
    id: 'labour-cost',
    title: 'Labour',
    means: 'The minutes worked, at the branch’s hourly cost on the day the car was finished.',
    formula: ['a stage = minutes × hourly cost ÷ 60, rounded; labour = the sum of the stages'],
    leftOut: 'Overheads that the hourly cost does not contain.',
    source: OWN,
  },
  {
    id: 'product-cost',
    title: 'Product',
    means: 'The millilitres used, at the product’s cost per litre on the day the car was finished.',
    formula: ['a product = millilitres × cost per litre ÷ 1000, rounded; then summed'],
    source: OWN,
  },
  {
    id: 'consumables',
    title: 'Consumables and bought-in',
    means:
      'Clips, plugs, film and steel by number and unit cost, and what was bought from others for this car. A unit cost on the job counts before the one in the catalogue.',
    formula: ['consumables = Σ quantity × unit cost'],
    source: OWN,
  },
  {
    id: 'fee',
    title: 'Network fee',
    means:
      'The share of the bill that goes to the network, at the rate of the day the car was finished.',
    formula: ['fee = revenue × fee rate, rounded, once a car'],
    source: OWN,
  },
  {
    id: 'without-cost',
    title: 'Cars left out for a missing cost',
    means:
      'A car whose hourly cost, product cost, unit cost or fee rate is not known for its day is taken and counted, but left out of every money figure. The page names what is missing, so that head office can set it.',
    formula: ['a cost is valid from its date on, that day included'],
    leftOut:
      'No cost is ever taken as 0, nor from a later date. A missing cost of a product that only the norm names touches the expected margin alone.',
    source: OWN,
  },
  {
    id: 'rounding',
    title: 'Rounding',
    means:
      'Each line of a car (a stage, a product, a consumable, the fee) is rounded to the cent, half a cent upward; sums are sums of rounded lines and are never rounded again. Tables show whole units of money, their totals come from the cents.',
    formula: ['rounded = ⌊x + ½⌋, in whole-number arithmetic'],
    source: OWN,
  },
  {
    id: 'expected-margin',
    title: 'Expected margin',
    means: 'The margin that the estimate promised: the same lines, taken from what was quoted.',
    formula: [
      'expected = quoted price − estimated minutes at the hourly cost − norm product − fee on the quoted price',
      'no consumables and nothing bought in are expected',
    ],
    leftOut:
      'Cars without a bill, without an estimate, or without a norm for their package and body type. Norms are not dated: the present norm is applied to the whole past.',
    source: OWN,
  },
  {
    id: 'bridge',
    title: 'From expected to kept (the bridge)',
    means:
      'Six steps that lead from the expected margin to the one that was kept, for the cars that have both. Each step is its effect on margin: a cost above plan is negative. They add up to the cent.',
    formula: [
      'price = revenue − quoted price',
      'planned labour = estimated − actual labour of every stage but repair',
      'rot labour = estimated − actual labour of the stage repair',
      'product = norm − actual product',
      'consumables, bought-in = −(consumables + bought-in)',
      'fee = fee on the quoted price − fee on the bill',
      'expected + six steps = kept',
      'points of margin = step ÷ revenue of the week’s billed cars with all costs',
    ],
    leftOut: 'Cars without an estimate or a norm; the title says how many of the cars are in.',
    source: OWN,
  },
  {
    id: 'largest-step',
    title: 'Largest step, and “as planned”',
    means:
      'The step with the largest effect either way. A car reads “as planned” while kept and expected margin lie within 2 % of its bill.',
    source: OWN,
  },
  {
    id: 'unbilled',
    title: 'Finished, not billed',
    means:
      'Cars that were completed by the end of the week in view and still have no bill. Waiting counts days from completion to today; cost so far is labour, product, consumables and bought-in, without the fee that a bill would bring.',
    leftOut: 'They are in no margin, no limit and no trend until they are billed.',
    source: OWN,
  },
  {
    id: 'beyond-charged',
    title: 'Worked beyond what was charged',
    means:
      'Minutes of an unbilled car that neither the estimate nor a charged finding covers: what may be forgotten on the bill.',
    formula: [
      'beyond = actual minutes − estimated minutes − repair minutes of findings with a charge; never below 0',
    ],
    leftOut: 'Cars without an estimate. Agreed extras are shown beside, not taken off.',
    source: OWN,
  },
  {
    id: 'target',
    title: 'Target',
    means:
      'The share that the branch, or failing that the network, has set itself. A line to look at: no week is judged by it.',
    source: OWN,
  },
];

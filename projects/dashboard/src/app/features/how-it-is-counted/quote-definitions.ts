import { type Definition, OWN } from './definition';

/** What the next car is likely to take. */
export const quoteDefinitions: readonly Definition[] = [
  {
    id: 'quote',
    title: 'Quote',
    means:
      'What cars like the one asked for have taken. The cars come from the nearest set with at least 30 in three years, always within the package: the branch’s own of its model and age, of its body type and age, of its age; the same three over the network; then the branch’s whole package, then the network’s. The set is named beside the figures.',
    leftOut:
      'Jobs older than three years or without minutes. The network’s cars are used only where at least 5 other branches are behind them, and are not shown one by one. No set of 30 cars, no numbers.',
    source: OWN,
  },
  {
    id: 'quote-labour',
    title: 'Labour of a quote',
    means:
      'Half of the cars were done within the first time, four of five within the second. Each stage has its own two, so stages do not add up to the whole: the car that is slow to strip is not the one that is slow to repair.',
    formula: ['P50 and P80 of the cars’ minutes, type 7, rounded to whole minutes'],
    source: 'Hyndman and Fan, The American Statistician 50, 1996, 361–365.',
  },
  {
    id: 'quote-chances',
    title: 'What may turn up',
    means:
      'The share of the set’s cars on which rot was found, and of its bubbles that were worked the share that were holes, each with its 95 % interval.',
    formula: ['cars with rot / cars', 'bubbles worked as holed / bubbles worked'],
    leftOut: 'With fewer than 5 behind it no share is said.',
    source:
      'Interval: Wilson, JASA 22, 1927, 209–212; Newcombe, Statistics in Medicine 17, 1998, 857–872, method 3.',
  },
  {
    id: 'quote-price',
    title: 'Price of a quote',
    means:
      'The price before tax that leaves the wanted margin when the car takes the time that four of five stayed within. Without a margin asked for it is the branch’s target, or else the network’s.',
    formula: [
      'cost = labour at P80 + mean product + mean consumables and bought-in, at today’s rates',
      'price = cost / (1 − network fee − margin), rounded up to whole minor units',
    ],
    leftOut:
      'No price where fee and margin leave nothing, a rate of today is missing, or there is no set of 30 cars.',
    source: OWN,
  },
];

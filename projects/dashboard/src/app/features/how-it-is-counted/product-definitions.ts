import { type Definition, OWN } from './definition';

/** Product use against the norm, by branch and temperature, and what the coming weeks need. */
export const productDefinitions: readonly Definition[] = [
  {
    id: 'product-use',
    title: 'Use of a product',
    means:
      'Millilitres of a product a car, by package and body type: their mean, the middle half, and 8 of 10 cars. The norm is what head office expects of such a car; it carries no date, so today’s norm judges past cars too.',
    formula: [
      'ml of a car = Σ ml of its lines with the product',
      'share of the norm = ml ÷ norm ml',
      'cost a car = mean of the cars’ rounded costs',
    ],
    leftOut:
      'With a norm every car of the package and body type counts, with 0 ml where the product is not listed. Without a norm only cars that list it. A car whose cost was not known on its day stands outside the cost.',
    source:
      'Quantiles: R. J. Hyndman and Y. Fan, Sample quantiles in statistical packages, The American Statistician 50, 1996, type 7.',
  },
  {
    id: 'under-and-over',
    title: 'Under and over the norm',
    means:
      'Cars that got less than 70 % of the norm, and cars that got more than 130 %. Under is the graver: what went on thin comes back as warranty work, while over costs product.',
    formula: ['under: ml < 0.7 × norm', 'over: ml > 1.3 × norm'],
    leftOut: 'Products without a norm for the package and body type.',
    source: 'This product’s definition; 70 % and 130 % are its own choice.',
  },
  {
    id: 'ratio-to-norm',
    title: 'Ratio to the norm',
    means:
      'All millilitres that went in, over all that the norms of the same cars asked for; of one branch or of all in view. A branch lies clearly below or above only when its whole interval misses 100 %.',
    formula: [
      'ratio = Σ ml ÷ Σ norm ml',
      's.e. = √( Σ (ml − ratio × norm)² ÷ (n (n − 1)) ) ÷ mean norm',
      'interval = ratio ± 1.96 × s.e.',
    ],
    leftOut: 'Products without a norm, and cars whose package and body type have none.',
    source:
      'Ratio estimator: W. G. Cochran, Sampling Techniques, 3rd ed. 1977, chapter 6. 1.96 is the normal quantile of 97.5 %.',
  },
  {
    id: 'product-temperature',
    title: 'Product and workshop temperature',
    means:
      'How many millilitres more or less go in for every degree that the workshop is warmer: the middle of the slopes between all pairs of cars, which single odd cars cannot bend. Give or take is half of its 95 % interval. The picture shows the middle half of the cars in steps of 5 °C.',
    formula: ['slope = median of (ml₂ − ml₁) ÷ (°C₂ − °C₁) over all pairs of cars'],
    leftOut:
      'Cars that do not list the product or give no temperature; pairs at the same temperature.',
    source:
      'P. K. Sen, Estimates of the regression coefficient based on Kendall’s tau, JASA 63, 1968, 1379–1389.',
  },
  {
    id: 'coming-need',
    title: 'What to order',
    means:
      'What the eight whole weeks after this one are expected to take: cars in the diary, and where it is not full yet the cars that usually come, each with what cars of its package and body type took. The range holds the real need 95 times of 100, if cars come and are treated as before.',
    formula: ['need = Σ (cars in the diary + usual cars) × ml a car', 'cost = need × today’s cost'],
    leftOut:
      'What is on the shelf, which is not known here. Cars of a kind that has neither 5 cars behind it nor a norm: they are counted and told.',
    source: OWN,
  },
];

import type { ProductTemperature } from '#shared/contracts/products';
import type { UseByTemperatureInput } from '../../charts/use-by-temperature/use-by-temperature-input';
import type { Column } from '../../ui/data-table/column';
import { formatCars, formatCount, formatNumber } from '../../ui/format';
import type { ProductWords } from './product-words';

/** Width of a class of temperature, °C. */
const CLASS_WIDTH = 5;

type Class = ProductTemperature['classes'][number];

/** One product by workshop temperature: the finding in words, the picture, its table. */
export interface TemperaturePicture {
  readonly finding: string;
  /** Null when no car has a temperature. */
  readonly chart: UseByTemperatureInput | null;
  readonly columns: readonly Column<Class>[];
  readonly rows: readonly Class[];
}

/** Turns a product's temperatures into a sentence and a picture. */
export function temperaturePicture(
  product: string,
  temperature: ProductTemperature | undefined,
  words: ProductWords,
): TemperaturePicture {
  const classes = [...(temperature?.classes ?? [])].sort((a, b) => a.fromC - b.fromC);
  const finding = findingOf(product, temperature, words);
  return {
    finding,
    chart:
      classes.length === 0
        ? null
        : {
            summary: `${finding} Half of the cars got ${classes.map(classSaid).join('; ')}.`,
            tick: formatCount,
            classes: classes.map(({ fromC, cars, p25Ml, medianMl, p75Ml }) => ({
              fromC,
              toC: fromC + CLASS_WIDTH,
              count: formatCount(cars),
              quartiles:
                p25Ml === null || medianMl === null || p75Ml === null
                  ? null
                  : { p25: p25Ml, median: medianMl, p75: p75Ml },
            })),
          },
    rows: classes,
    columns: [
      { key: 'class', label: 'Workshop, °C', text: classText, sortBy: ({ fromC }) => fromC },
      number('cars', 'Cars', ({ cars }) => formatCount(cars)),
      number('lower', 'A quarter got less', ({ p25Ml }) => ml(p25Ml)),
      number('median', 'Half got at least, ml', ({ medianMl }) =>
        medianMl === null ? 'too few cars yet' : ml(medianMl),
      ),
      number('upper', 'A quarter got more', ({ p75Ml }) => ml(p75Ml)),
    ],
  };
}

/** "41 ml less for every degree warmer (give or take 6, 380 cars): cold wax is thick and does not run." */
function findingOf(
  product: string,
  temperature: ProductTemperature | undefined,
  words: ProductWords,
): string {
  if (!temperature || temperature.cars === 0) {
    return 'No car with this product says how warm the workshop was.';
  }
  const { slopeMlPerDegree: slope, lower, upper, cars } = temperature;
  if (slope === null) {
    return cars < 5
      ? `Too few cars yet: ${formatCars(cars)} with a temperature.`
      : `Nothing can be said yet: ${formatCars(cars)}, hardly any at different temperatures.`;
  }
  const change = `${millilitres(Math.abs(slope))} ml ${slope < 0 ? 'less' : 'more'} for every degree warmer`;
  if (lower === null || upper === null) {
    return `About ${change} (${formatCars(cars)}).`;
  }
  const behind = `give or take ${millilitres((upper - lower) / 2)}, ${formatCars(cars)}`;
  if (lower <= 0 && upper >= 0) {
    return `No clear change with temperature (${millilitres(slope)} ml a degree, ${behind}).`;
  }
  const why =
    slope < 0 && words.isWax(product)
      ? ': cold wax is thick and does not run, so more goes in'
      : '';
  return `${change} (${behind})${why}.`;
}

/** Whole millilitres from 2 on; one decimal below, where rounding would say 0. */
function millilitres(value: number): string {
  return value === 0 || Math.abs(value) >= 2 ? formatCount(value) : formatNumber(value, 1);
}

function classSaid(one: Class): string {
  const median = one.medianMl === null ? 'too few cars yet' : `${ml(one.medianMl)} ml or more`;
  return `${median} at ${classText(one)} °C (${formatCars(one.cars)})`;
}

function classText({ fromC }: Class): string {
  const dash = fromC < 0 ? ' to ' : '–';
  return `${formatCount(fromC)}${dash}${formatCount(fromC + CLASS_WIDTH)}`;
}

function ml(value: number | null): string {
  return value === null ? '' : formatCount(value);
}

function number(key: string, label: string, text: (one: Class) => string): Column<Class> {
  return { key, label, kind: 'number', text };
}

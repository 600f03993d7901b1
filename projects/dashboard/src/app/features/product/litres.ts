import { formatNumber } from '../../ui/format';

const UNIT = '\u202fL';
/** From a range of so many millilitres on, tenths of a litre would say more than is known. */
const WHOLE_LITRES = 5000;

/** Millilitres as litres, to the tenth or, where the range is wide, to the whole: "4.2 L", "340 L". */
export function litres(ml: number, rangeMl: number): string {
  return `${formatNumber(ml / 1000, decimalsOf(rangeMl))}${UNIT}`;
}

/** Two ends of a range as litres: "300–381 L"; nothing where nothing says how far it reaches. */
export function litresRange(lowerMl: number, upperMl: number): string {
  if (upperMl <= lowerMl) return '';
  const decimals = decimalsOf(upperMl - lowerMl);
  return `${formatNumber(lowerMl / 1000, decimals)}–${formatNumber(upperMl / 1000, decimals)}${UNIT}`;
}

function decimalsOf(rangeMl: number): number {
  return rangeMl >= WHOLE_LITRES ? 0 : 1;
}

import type { CurveMonth } from './claim-free-input';

/**
 * A curve in steps and the band about it, as paths: a month's claims fall at its end, so each step runs level to there and then
 * down. From the first month that is not told on nothing is drawn.
 */
export function curvePaths(
  months: readonly CurveMonth[],
  x: (month: number) => number,
  y: (share: number) => number,
): { readonly line: string; readonly band: string } {
  const untold = months.findIndex(({ share }) => share === null);
  const told = untold === -1 ? months : months.slice(0, untold);
  const start = `M${round(x(0))} ${round(y(1))}`;
  const steps = (value: (month: CurveMonth) => number): string =>
    told.map((month) => `H${round(x(month.month))}V${round(y(value(month)))}`).join('');
  const back = told
    .map(
      (month, index) =>
        `V${round(y(month.lower ?? month.share!))}H${round(x(told[index - 1]?.month ?? 0))}`,
    )
    .reverse()
    .join('');
  return {
    line: start + steps(({ share }) => share!),
    band:
      told.length === 0 ? '' : `${start}${steps(({ upper, share }) => upper ?? share!)}${back}Z`,
  };
}

function round(px: number): number {
  return Math.round(px * 10) / 10;
}

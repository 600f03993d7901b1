/**
 * How far ln(1 + e) falls short of e: e − ln(1 + e), at least 0, without losing a digit near 0, where the two nearly agree.
 * It is the exponent of a gamma or beta density, counted from its peak. `ratio` is 1 + e, given apart
 * where e alone would lose its digits: near −1.
 *
 * Source: C. Loader, "Fast and accurate computation of binomial probabilities" (2000), deviance term bd0: with
 * v = e/(2 + e), ln(1 + e) = 2(v + v³/3 + v⁵/5 + …) and e − 2v = e·v.
 */
export function logShortfall(e: number, ratio: number = 1 + e): number {
  if (Math.abs(e) > 0.3) return e - Math.log(ratio);
  const v = e / (2 + e);
  let power = 2 * v;
  let sum = e * v;
  for (let odd = 3; odd < 40; odd += 2) {
    power *= v * v;
    const less = sum - power / odd;
    if (less === sum) break;
    sum = less;
  }
  return sum;
}

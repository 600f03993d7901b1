/** A diagonal entry that elimination leaves this much smaller is 0 but for rounding. */
const ROUNDING = 1e-10;

/**
 * x′ V⁻¹ x of a variance matrix and a list, by Cholesky's decomposition V = L L′: the sum of squares of L⁻¹ x. `undefined`
 * where V has no inverse.
 */
export function quadraticForm(
  variance: readonly (readonly number[])[],
  x: readonly number[],
): number | undefined {
  const lower: number[][] = [];
  const solved: number[] = [];
  for (const [row, entries] of variance.entries()) {
    const line: number[] = [];
    for (let column = 0; column < row; column += 1) {
      const other = lower[column] as number[];
      line.push(
        ((entries[column] as number) - dot(line, other, column)) / (other[column] as number),
      );
    }
    const whole = entries[row] as number;
    const left = whole - dot(line, line, row);
    if (!(left > ROUNDING * whole)) return undefined;
    const root = Math.sqrt(left);
    solved.push(((x[row] as number) - dot(line, solved, row)) / root);
    lower.push([...line, root]);
  }
  return dot(solved, solved, solved.length);
}

function dot(a: readonly number[], b: readonly number[], length: number): number {
  let sum = 0;
  for (let index = 0; index < length; index += 1) {
    sum += (a[index] as number) * (b[index] as number);
  }
  return sum;
}

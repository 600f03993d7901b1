/** One comparison of a run: ours beside a yardstick, and their ratio. */
export interface Line {
  what: string;
  ours: number;
  yardstick: string;
  theirs: number;
  ratio: number;
  aim: string;
}

/** Compares two figures measured in the same run. */
export function ratioLine(
  what: string,
  ours: number,
  yardstick: string,
  theirs: number,
  aim: string,
): Line {
  return { what, ours, yardstick, theirs, ratio: ours / theirs, aim };
}

/** The middle of several measurements. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? Number.NaN;
}

/** Writes the lines for a person. */
export function print(lines: readonly Line[]): void {
  for (const { what, ours, yardstick, theirs, ratio, aim } of lines) {
    process.stdout.write(
      `${what}: ${figure(ours)}\n  ${yardstick}: ${figure(theirs)}\n  ratio ${ratio.toFixed(2)} (${aim})\n`,
    );
  }
}

function figure(value: number): string {
  return value >= 100 ? value.toFixed(0) : value.toFixed(2);
}

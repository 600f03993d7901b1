import type { WarrantyBranch } from '#shared/contracts/warranty';
import { COLOURS } from './colours';
import { decimals, whole } from './format';
import { heading, quietly } from './headings';
import type { Paper } from './paper';
import { rowsByPage } from './rows-by-page';
import { standing, standsOutside } from './say-report';
import { shortened } from './shortened';

const ROW = 16;
const LETTERING = { size: 8.5 } as const;
const HEAD = { size: 8.5, colour: COLOURS.quiet, align: 'centre' } as const;
/** The axis is of logarithms: half lies as far from "as expected" as twice does. */
const MARKS = [
  [0.25, 'a quarter'],
  [0.5, 'half'],
  [1, 'as expected'],
  [2, 'twice'],
  [4, 'four times'],
] as const;

/** Each branch's claims against what was expected of it: a dot with its interval. */
export function expectedPicture(
  paper: Paper,
  branches: readonly WarrantyBranch[],
  nameOf: (code: string) => string,
): void {
  heading(
    paper,
    'Claims against expected, by branch',
    'Claims / expected for its packages, ages and years of cover; dot and 95 % interval. Shape and word where the interval misses 1.',
    ROW * Math.min(branches.length + 2, 26),
  );
  const drawn = branches.filter(({ ratio }) => ratio !== null);
  const span = drawn.some(({ lower, upper }) => (lower ?? 1) < 0.33 || (upper ?? 1) > 3) ? 4 : 2;
  const reach = span * 1.4;
  const [from, to] = [paper.left + 200, paper.right - 62];
  const x = (ratio: number): number => {
    const clipped = Math.min(Math.max(ratio, 1 / reach), reach);
    return from + ((to - from) * (Math.log(clipped) + Math.log(reach))) / (2 * Math.log(reach));
  };
  const outside = drawn.filter((branch) => standsOutside(branch));
  const told = outside.map((branch) => `${nameOf(branch.branch)} ${standing(branch)}`);
  if (branches.length === 0) {
    quietly(paper, 'There are no branches.');
    return;
  }
  const axis = (): void => {
    for (const [ratio, words] of MARKS) {
      if (ratio >= 1 / span && ratio <= span) paper.text(words, x(ratio), paper.y + 10, HEAD);
    }
    paper.y += ROW;
  };
  const row = (branch: WarrantyBranch): void => {
    for (const [ratio] of MARKS) {
      if (ratio < 1 / span || ratio > span) continue;
      const colour = ratio === 1 ? COLOURS.tide : COLOURS.hairline;
      paper.rule(x(ratio), paper.y, x(ratio), paper.y + ROW, colour, ratio === 1 ? 1.25 : 0.5);
    }
    branchRow(paper, branch, nameOf(branch.branch), x);
  };
  rowsByPage(paper, branches, ROW, (rows) =>
    paper.tagged(
      'Figure',
      () => {
        axis();
        for (const branch of rows) row(branch);
      },
      {
        alt: `Dots of claims against expected. ${told.length > 0 ? told.join('; ') : 'No branch stands outside'}.`,
      },
    ),
  );
  paper.y += 6;
}

function branchRow(
  paper: Paper,
  branch: WarrantyBranch,
  name: string,
  x: (ratio: number) => number,
): void {
  const { ratio, lower, upper } = branch;
  const stands = standing(branch);
  const outside = stands === 'above' || stands === 'below';
  const weight = outside ? 600 : 400;
  const base = paper.y + 11;
  const middle = paper.y + ROW / 2;
  paper.text(shortened(paper, name, 118, { ...LETTERING, weight }), paper.left, base, {
    ...LETTERING,
    weight,
  });
  const counts = `${whole(branch.claims)} / ${decimals(branch.expected, branch.expected < 10 ? 1 : 0)}`;
  paper.text(counts, paper.left + 180, base, {
    ...LETTERING,
    colour: COLOURS.quiet,
    align: 'right',
  });
  if (ratio === null || lower === null || upper === null) {
    paper.text('nothing expected', paper.right, base, {
      ...LETTERING,
      colour: COLOURS.quiet,
      align: 'right',
    });
  } else {
    const colour =
      stands === 'above' ? COLOURS.oxide : stands === 'below' ? COLOURS.tide : COLOURS.ink;
    paper.rule(x(lower), middle, x(upper), middle, colour, 1.3);
    mark(paper, x(ratio), middle, stands, colour);
    const words = `${decimals(ratio, 1)}${outside ? ` ${stands}` : ''}`;
    paper.text(words, paper.right, base, {
      ...LETTERING,
      weight,
      colour: outside ? colour : COLOURS.ink,
      align: 'right',
    });
  }
  paper.y += ROW;
  paper.rule(paper.left, paper.y, paper.right, paper.y, COLOURS.hairline, 0.4);
}

function mark(
  { doc }: Paper,
  x: number,
  y: number,
  stands: ReturnType<typeof standing>,
  colour: string,
): void {
  if (stands === 'above') doc.polygon([x, y - 4], [x + 4, y + 3], [x - 4, y + 3]).fill(colour);
  else if (stands === 'below') doc.polygon([x, y + 4], [x + 4, y - 3], [x - 4, y - 3]).fill(colour);
  else doc.circle(x, y, 2.8).fill(colour);
}

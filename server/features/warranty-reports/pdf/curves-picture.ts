import type { ClaimFreeGroup, WarrantyAnswer } from '#shared/contracts/warranty';
import { COLOURS } from './colours';
import { decimals, percent, whole } from './format';
import { heading, quietly } from './headings';
import { shortened } from './shortened';
import type { Paper } from './paper';
import { steps, trace, type Point } from './steps';

const HEIGHT = 152;
const ROW = 14;
const LABELS = 120;
const NAMES = 92;
const QUIET = { size: 8.5, colour: COLOURS.quiet };
/** Curves are told apart by their dashes as well as by colour. */
const LOOKS = [
  { colour: COLOURS.tide, dash: undefined },
  { colour: COLOURS.amber, dash: [7, 4] },
  { colour: COLOURS.oxide, dash: [1.5, 3] },
  { colour: COLOURS.ink, dash: [7, 3, 1.5, 3] },
] as const;

/** Shares of cars without a claim by months since completion, with bands and numbers at risk. */
export function curvesPicture(
  paper: Paper,
  { groups, claimFree, logRank, groupBy }: WarrantyAnswer,
  nameOf: (key: string) => string,
): void {
  const whole: ClaimFreeGroup[] = [{ key: '', cars: 0, claims: 0, months: claimFree }];
  const drawn = (groups.length > 0 ? groups : whole)
    .map((group) => ({
      name: group.key === '' ? 'all cars' : nameOf(group.key),
      months: group.months.filter(({ share }) => share !== null),
    }))
    .filter(({ months }) => months.length > 0);
  const test = logRank ? ` Log-rank ${tellP(logRank.p)}.` : '';
  const floor = floorOf(
    drawn.flatMap(({ months }) => months.map(({ lower, share }) => lower ?? share ?? 1)),
  );
  heading(
    paper,
    'Cars still without a claim, %',
    `By months since completion${groupBy === 'package' ? ', by package' : ''}, with 95 % bands.${floor > 0 ? ` The axis starts at ${decimals(floor * 100, 0)}.` : ''}${test}`,
    HEIGHT + 40 + ROW * (drawn.length + 1),
  );
  if (drawn.length === 0) {
    quietly(paper, 'Fewer than 5 cars were at risk in every month, so no share is given.');
    return;
  }
  const told = drawn.map(({ name, months }) => {
    const last = months.at(-1);
    return `${name}: ${percent(last?.share ?? 1, 1)} after ${last?.month ?? 0} months`;
  });
  paper.tagged('Figure', () => draw(paper, drawn, floor), {
    alt: `Curves of cars still without a claim. ${told.join('; ')}.`,
  });
}

type Drawn = { name: string; months: ClaimFreeGroup['months'] };

function draw(paper: Paper, drawn: readonly Drawn[], floor: number): void {
  const { doc } = paper;
  const last = Math.max(...drawn.flatMap(({ months }) => months.map(({ month }) => month)));
  const [left, right] = [paper.left + NAMES + 10, paper.right - LABELS];
  const [top, base] = [paper.y + 8, paper.y + HEIGHT - 22];
  const x = (month: number): number => left + ((right - left) * month) / last;
  const y = (share: number): number => base - ((base - top) * (share - floor)) / (1 - floor);
  for (let line = 0; line <= 4; line += 1) {
    const share = floor + ((1 - floor) * line) / 4;
    paper.rule(left, y(share), right, y(share), line === 0 ? COLOURS.ink : COLOURS.hairline, 0.6);
    paper.text(decimals(share * 100, 0), left - 8, y(share) + 3, { ...QUIET, align: 'right' });
  }
  drawn.forEach(({ months }, index) => {
    const { colour, dash } = LOOKS[index % LOOKS.length] ?? LOOKS[0];
    const at = (value: (month: Drawn['months'][number]) => number | null): Point[] => [
      [x(0), y(1)],
      ...months.map((month): Point => [x(month.month), y(Math.max(value(month) ?? 1, floor))]),
    ];
    const band = [
      ...steps(at(({ upper, share }) => upper ?? share)),
      ...steps(at(({ lower, share }) => lower ?? share)).reverse(),
    ];
    trace(doc, band).fillOpacity(0.16).fill(colour).fillOpacity(1);
    doc.lineWidth(1.6);
    if (dash) doc.dash([...dash] as never, {});
    else doc.undash();
    trace(doc, steps(at(({ share }) => share))).stroke(colour);
    doc.undash();
  });
  labels(paper, drawn, { x: right + 8, y, top, base });
  const every = last <= 12 ? 3 : last <= 36 ? 6 : last <= 72 ? 12 : 24;
  const ticks = Array.from({ length: Math.floor(last / every) + 1 }, (_, tick) => tick * every);
  paper.text('months', paper.left, base + 13, QUIET);
  for (const month of ticks) {
    paper.rule(x(month), base, x(month), base + 3, COLOURS.ink, 0.6);
    paper.text(String(month), x(month), base + 13, { ...QUIET, align: 'centre' });
  }
  paper.text('cars at risk', paper.left, base + 28, QUIET);
  drawn.forEach(({ name, months }, index) => {
    const row = base + 28 + ROW * (index + 1);
    const lettering = { size: 8.5, weight: 500 } as const;
    paper.text(shortened(paper, name, NAMES - 14, lettering), paper.left, row, lettering);
    for (const month of ticks) {
      const found = months.find((one) => one.month === Math.max(month, 1));
      if (found) paper.text(whole(found.atRisk), x(month), row, { size: 8.5, align: 'centre' });
    }
  });
  paper.y = base + 28 + ROW * (drawn.length + 1);
}

/** Each curve is named at its right end; names that would lie on each other are moved apart. */
function labels(
  paper: Paper,
  drawn: readonly Drawn[],
  { x, y, top, base }: { x: number; y: (share: number) => number; top: number; base: number },
): void {
  const ends = drawn
    .map(({ name, months }, index) => ({ name, index, share: months.at(-1)?.share ?? 1, at: 0 }))
    .sort((a, b) => b.share - a.share);
  let above = top - 12;
  for (const end of ends) {
    end.at = Math.max(y(Math.max(end.share, 0)), above + 12);
    above = end.at;
  }
  let below = base + 8;
  for (const end of [...ends].reverse()) {
    end.at = Math.min(end.at, below - 4);
    below = end.at - 8;
  }
  for (const { name, index, share, at } of ends) {
    const { colour, dash } = LOOKS[index % LOOKS.length] ?? LOOKS[0];
    paper.doc.lineWidth(1.6);
    if (dash) paper.doc.dash([...dash] as never, {});
    paper.doc
      .moveTo(x, at)
      .lineTo(x + 18, at)
      .stroke(colour);
    paper.doc.undash();
    const figure = percent(share);
    const bold = { size: 8.5, weight: 600 } as const;
    paper.text(figure, x + 22, at + 3, bold);
    const from = x + 26 + paper.widthOf(figure, bold);
    paper.text(shortened(paper, name, paper.right - from, { size: 8.5 }), from, at + 3, {
      size: 8.5,
    });
  }
}

/** The highest round share below everything drawn, so that what there is to see fills the picture. */
function floorOf(shares: readonly number[]): number {
  const least = Math.min(...shares, 1);
  for (const floor of [0.96, 0.92, 0.88, 0.8, 0.6]) if (least >= floor) return floor;
  return 0;
}

function tellP(p: number): string {
  return p < 0.001 ? 'p < 0.001' : `p = ${decimals(p, p < 0.1 ? 3 : 2)}`;
}

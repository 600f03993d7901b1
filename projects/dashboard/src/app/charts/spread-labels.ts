/**
 * Moves labels that stand at given heights apart until none is closer than `gap` to its neighbour, each as near to its place as
 * the others allow (pool-adjacent averages: labels that would meet form a block centred on its members' own places).
 * Keeps the order of the input; px in, px out.
 */
export function spreadLabels(places: readonly number[], gap: number): number[] {
  const order = places.map((place, index) => ({ place, index })).sort((a, b) => a.place - b.place);
  const blocks: { sum: number; members: number[] }[] = [];
  for (const { place, index } of order) {
    blocks.push({ sum: place, members: [index] });
    while (blocks.length > 1 && overlaps(blocks.at(-2)!, blocks.at(-1)!, gap)) {
      const last = blocks.pop()!;
      const before = blocks.at(-1)!;
      before.sum += last.sum;
      before.members.push(...last.members);
    }
  }
  const spread = [...places];
  for (const block of blocks) {
    block.members.forEach((member, position) => {
      spread[member] = topOf(block, gap) + position * gap;
    });
  }
  return spread;
}

function topOf(block: { sum: number; members: number[] }, gap: number): number {
  return block.sum / block.members.length - ((block.members.length - 1) * gap) / 2;
}

function overlaps(
  upper: { sum: number; members: number[] },
  lower: { sum: number; members: number[] },
  gap: number,
): boolean {
  return topOf(lower, gap) - (topOf(upper, gap) + (upper.members.length - 1) * gap) < gap;
}

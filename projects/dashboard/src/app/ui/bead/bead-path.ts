/** Depth of the bead in CSS px. */
export const BEAD_DEPTH = 6;
/** Distance between two cuts, near which the real pitch is chosen so that whole lobes fill the width. */
const PITCH = 9.5;

/** The two paths of a bead: its filled body and the crescents cut into it. */
export interface BeadPaths {
  readonly body: string;
  readonly cuts: string;
}

/** A bead of a given width: flat along the seam, a softly scalloped foot, a crescent between every two lobes. */
export function beadPaths(width: number): BeadPaths {
  if (!(width > 0)) return { body: '', cuts: '' };
  const lobes = Math.max(1, Math.round(width / PITCH));
  const pitch = width / lobes;
  const shoulder = Math.min(2.6, pitch / 3);
  const foot = Array.from({ length: lobes }, (_, index) => {
    // From right to left, each lobe's foot swings a little below the cuts beside it.
    const from = width - index * pitch;
    const left = index === lobes - 1 ? shoulder : from - pitch;
    const right = index === 0 ? width - shoulder : from;
    return `Q${round((left + right) / 2)} ${BEAD_DEPTH + 0.7} ${round(left)} ${BEAD_DEPTH - 0.9}`;
  }).join('');
  const body =
    `M0 0H${round(width)}C${round(width)} 2.6 ${round(width - 0.8)} 4.4 ${round(width - shoulder)} ${BEAD_DEPTH - 0.9}` +
    `${foot}C0.8 4.4 0 2.6 0 0Z`;
  const cuts = Array.from({ length: lobes - 1 }, (_, index) => {
    const x = round((index + 1) * pitch - 0.8);
    return `M${x} 0.6Q${round(x + 2.2)} 3.2 ${x} ${BEAD_DEPTH}`;
  }).join('');
  return { body, cuts };
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}

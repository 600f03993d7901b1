import { box, joined, mirrored } from './outline';

/** What a car has below besides its zones: outline, wheels, engine and gearbox, exhaust, tank, pipes. Not shaded, not touched. */

const HALF_BODY =
  'M4 195 C4 134 8 86 29 56 C47 30 100 13 176 10 C230 7 285 7 330 9 L718 9 C768 4 838 4 876 8 C918 13 952 27 971 62 C990 100 996 146 996 195';

/** The body's edge. */
export const BODY = joined(HALF_BODY);

const LEFT_TYRES = [box(134, 35, 136, 46, 9), box(739, 35, 136, 46, 9)];
/** The four tyres. */
export const TYRES = [...LEFT_TYRES, ...LEFT_TYRES.map(mirrored)];

const LEFT_TREAD = [142, 747].flatMap((start) => [
  `M${start} 58 L${start + 120} 58`,
  ...Array.from({ length: 10 }, (_, index) => {
    const x = start + 4 + index * 12;
    return `M${x} 40 L${x + 5} 58 L${x} 76`;
  }),
]);
/** The tyres' tread. */
export const TREAD = [...LEFT_TREAD, ...LEFT_TREAD.map(mirrored)].join(' ');

/** Lies under the zones: radiator, sump, gearbox, bulkhead, tunnel edges, tank. */
export const UNDER = [
  'M53 128 L53 262 M58 128 L58 262',
  box(72, 136, 52, 76, 9),
  'M84 146 L112 146 M84 202 L112 202',
  'M76 219 L120 219 C123 219 124 221 124 224 L124 248 C124 256 119 260 112 260 L94 260 C86 260 82 256 80 249 L74 225 C73 221 73 219 76 219 Z',
  circle(101, 239, 10),
  circle(101, 239, 4),
  'M308 128 L308 180 M308 210 L308 262 M326 128 L326 180 M326 210 L326 262',
  'M296 176 L712 176 M296 214 L712 214',
  box(716, 128, 32, 134, 8),
  'M716 160 L748 160 M716 228 L748 228',
];

/** Fuel and brake lines along the tunnel. */
export const PIPES =
  'M296 181 L700 181 C708 181 710 178 716 178 M296 185 L704 185 C710 185 712 182 716 182';

/** The exhaust's pipe, drawn as two edges of one wide line. */
export const EXHAUST =
  'M300 198 L640 198 C672 198 684 214 698 232 C714 253 722 264 752 266 L846 268 C882 270 890 284 906 294';

/** The catalyst, the middle silencer and the silencer at the right of the tail, with its tailpipe. */
export const SILENCERS = [
  box(352, 188, 52, 20, 9),
  box(470, 184, 104, 28, 13),
  box(905, 272, 40, 52, 11),
];
export const TAILPIPE = 'M945 310 L981 310';

const LEFT_ARMS = ['M168 136 L195 82', 'M266 136 L209 82', 'M770 136 L800 82', 'M854 136 L814 82'];
/** Suspension arms, from the subframes to the wheels. */
export const ARMS = [...LEFT_ARMS, ...LEFT_ARMS.map(mirrored)].join(' ');

const LEFT_HOLES = [
  ...[100, 152, 236, 420, 520, 620, 782, 850, 910].map((x) =>
    circle(x, x > 300 && x < 740 ? 101.5 : 117, 2.4),
  ),
  circle(317, 60, 3.2),
  circle(317, 72, 3.2),
  circle(317, 84, 3.2),
  circle(370, 40, 5),
  circle(678, 40, 5),
];
/** Drain and working holes. */
export const HOLES = [...LEFT_HOLES, ...LEFT_HOLES.map(mirrored)];

const LEFT_RIBS = [
  'M424 58 L424 90 M432 58 L432 90 M612 58 L612 90 M620 58 L620 90',
  'M424 113 L424 164 M432 113 L432 164 M612 113 L612 164 M620 113 L620 164',
  'M356 128 L408 128 M356 138 L408 138 M356 148 L408 148',
  'M640 128 L692 128 M640 138 L692 138 M640 148 L692 148',
  'M884 142 L928 142 M884 150 L928 150',
];
/** Pressed ribs of the floor and the boot. */
export const RIBS = [...LEFT_RIBS, ...LEFT_RIBS.map(mirrored)].join(' ');

/** A circle as four curves, so that it can be mirrored like every other path. */
function circle(x: number, y: number, radius: number): string {
  return box(x - radius, y - radius, 2 * radius, 2 * radius, radius);
}

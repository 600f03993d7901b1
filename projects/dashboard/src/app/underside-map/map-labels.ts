import type { Side, Zone } from '#shared/domain/vocabulary';
import { naturalSides } from '#shared/domain/zone-sides';
import { spreadLabels } from '../charts/spread-labels';
import { formatShare } from '../ui/format';
import { SIDE_NAMES, ZONE_NAMES } from '../ui/words';
import { placed, type CarPlace } from './car-place';
import { anchorOf } from './geometry/anchors';
import type { Point } from './geometry/outline';
import { isSided } from './geometry/place-shapes';
import type { Painted } from './paint-areas';
import { placeKey } from './place-words';
import { lookOf, type Look } from './share-scale';
import type { UndersideArea } from './underside-input';

/** A share with its zone's name, and the line that leads to it. */
export interface MapLabel {
  readonly key: string;
  readonly told: 'share' | 'few';
  /** The share as it is read, or that there are too few cars to say it. */
  readonly share: string;
  readonly name: readonly string[];
  /** Where the share stands, its middle line; the name follows below, or beside it on one line. */
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly flow: 'below' | 'beside';
  /** What it stands on, when it stands on its zone. */
  readonly on: Look | null;
  readonly leader: { readonly from: Point; readonly to: Point } | null;
}

interface Rows {
  readonly above: number;
  readonly below: number;
  readonly rowHeight: number;
}

/** The row above and below: an even place for each zone, in the order of the points they lead to, so that no leaders cross. */
const ROW: readonly Zone[] = [
  'front_wing',
  'front_arch',
  'bulkhead_drain',
  'jacking_point',
  'sill_outer',
  'sill_inner',
  'door_bottom',
  'rear_arch',
];
const IN_THE_LEFT_GUTTER: readonly Zone[] = ['chassis_rail', 'slam_panel'];
const LINE = 20;

/** The labels of everything painted. */
export function mapLabels(
  painted: readonly Painted<UndersideArea>[],
  car: CarPlace,
  rows: Rows,
): readonly MapLabel[] {
  const one = painted.flatMap(({ area, sides }) => sides.map((side) => ({ area, side })));
  const inRow = one.filter(({ area }) => ROW.includes(area.zone));
  const atLeft = one.filter(({ area }) => IN_THE_LEFT_GUTTER.includes(area.zone));
  const atRight = one.filter(({ area }) => area.zone === 'tailgate');
  const inside = one.filter(
    (each) => ![inRow, atLeft, atRight].some((some) => some.includes(each)),
  );
  return [
    ...inRow.map((each) => rowLabel(each, car, rows)),
    ...gutterLabels(atLeft, car, 'left'),
    ...gutterLabels(atRight, car, 'right'),
    ...inside.map((each) => insideLabel(each, car)),
  ];
}

interface Shown {
  readonly area: UndersideArea;
  /** The side it is drawn on, which the centre of a zone on both sides is not. */
  readonly side: Side;
}

function rowLabel({ area, side }: Shown, car: CarPlace, rows: Rows): MapLabel {
  const pitch = Math.max(70, car.width * 0.114);
  const x = car.x + car.width * 0.026 + ROW.indexOf(area.zone) * pitch;
  const top = side === 'right' ? rows.below : rows.above;
  const to = placed(car, anchorOf(area.zone, side));
  const from: Point = [x, side === 'right' ? rows.below - 4 : rows.above + rows.rowHeight + 4];
  return { ...words(area, side), x, y: top + LINE / 2, anchor: 'middle', leader: { from, to } };
}

function gutterLabels(
  shown: readonly Shown[],
  car: CarPlace,
  end: 'left' | 'right',
): readonly MapLabel[] {
  const points = shown.map(({ area, side }) => placed(car, anchorOf(area.zone, side)));
  const ys = spreadLabels(
    points.map(([, y]) => y),
    2 * LINE + 6,
  );
  return shown.map(({ area, side }, index) => {
    const x = end === 'left' ? car.x - 18 : car.x + car.width + 14;
    const start = end === 'left' ? x + 6 : x - 6;
    const y = ys[index]!;
    const label = words(area, side, 'whole');
    return {
      ...label,
      x,
      y: y - LINE / 2,
      anchor: end === 'left' ? ('end' as const) : ('start' as const),
      leader: { from: [start, y] as const, to: points[index]! },
    };
  });
}

function insideLabel({ area, side }: Shown, car: CarPlace): MapLabel {
  const [x, y] = placed(car, anchorOf(area.zone, side));
  const label = words(area, side);
  const half = !isSided(area.zone) && side !== 'centre';
  if (area.zone === 'floor' || half) {
    const name = area.zone === 'floor' && side !== 'centre' ? 'floor' : SIDE_NAMES[area.side];
    return { ...label, name: [name], x, y, anchor: 'middle', flow: 'beside', on: onOf(area, side) };
  }
  return {
    ...label,
    x,
    y: y - (label.name.length * LINE) / 2,
    anchor: 'middle',
    on: onOf(area, side),
  };
}

/** The tunnel carries pipes, so its words stand on paper, not on their shade. */
function onOf({ zone, share }: UndersideArea, side: Side): Look | null {
  return zone === 'floor' && side === 'centre' ? null : lookOf(share);
}

function words(
  area: UndersideArea,
  side: Side,
  split: 'lines' | 'whole' = 'lines',
): Pick<MapLabel, 'key' | 'told' | 'share' | 'name' | 'flow' | 'on' | 'leader'> {
  const whole = ZONE_NAMES[area.zone];
  // A side is said where the place is not the whole of what the car has there.
  const usual = naturalSides(area.zone).includes(area.side) && side === area.side;
  const name = split === 'whole' ? [whole] : whole.split(' ');
  return {
    key: `${placeKey(area)}/${side}`,
    told: area.share === null ? 'few' : 'share',
    share: area.share === null ? 'too few' : formatShare(area.share),
    name: usual ? name : [...name, SIDE_NAMES[area.side]],
    flow: 'below',
    on: null,
    leader: null,
  };
}

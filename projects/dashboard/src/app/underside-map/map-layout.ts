import type { CarPlace } from './car-place';
import { CAR } from './geometry/outline';
import { isSided } from './geometry/place-shapes';
import { mapLabels, type MapLabel } from './map-labels';
import type { Painted } from './paint-areas';
import type { UndersideArea } from './underside-input';

/** Narrower than this there is no room for labels: the map stands alone, its figures in the list below. */
export const LABELLED_FROM = 760;
/** Room at the left for "chassis rail" and at the right for "tailgate", with their leaders. */
const GUTTER = { left: 100, right: 78 };
const LINE = 20;
/** From the foot of a row of labels to the car. */
const LEADER = 28;

/** Everything the map draws over the car, in CSS px. */
export interface MapPicture {
  readonly width: number;
  readonly height: number;
  readonly car: CarPlace;
  readonly labels: readonly MapLabel[];
  /** Base lines of the words "left side" and "right side". */
  readonly sideWords: { readonly left: number; readonly right: number };
}

/** Lays the map out for a width; without labels where it is too narrow for them. */
export function layOutMap(painted: readonly Painted<UndersideArea>[], width: number): MapPicture {
  if (width < LABELLED_FROM) return bare(width);
  const carWidth = width - GUTTER.left - GUTTER.right;
  const rows =
    3 + (painted.some(({ area }) => area.side === 'centre' && isSided(area.zone)) ? 1 : 0);
  const rowHeight = rows * LINE;
  const height = (carWidth * CAR.height) / CAR.width;
  const car = { x: GUTTER.left, y: rowHeight + LEADER, width: carWidth, height };
  const foot = car.y + height + LEADER;
  return {
    width,
    height: foot + rowHeight,
    car,
    labels: mapLabels(painted, car, { above: 0, below: foot, rowHeight }),
    sideWords: { left: LINE / 2, right: foot + rowHeight - LINE / 2 },
  };
}

function bare(width: number): MapPicture {
  const height = Math.round((width * CAR.height) / CAR.width);
  const car = { x: 0, y: 24, width, height };
  return {
    width,
    height: height + 48,
    car,
    labels: [],
    sideWords: { left: 10, right: height + 38 },
  };
}

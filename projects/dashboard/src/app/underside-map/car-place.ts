import { CAR, type Point } from './geometry/outline';

/** The car's place in a picture, CSS px. */
export interface CarPlace {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** A point of the drawing in CSS px. */
export function placed(car: CarPlace, [x, y]: Point): Point {
  const scale = car.width / CAR.width;
  return [car.x + x * scale, car.y + y * scale];
}

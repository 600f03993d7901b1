import type { Side } from '#shared/domain/vocabulary';
import { naturalSides } from '#shared/domain/zone-sides';
import { SIDE_NAMES, ZONE_NAMES } from '../ui/words';
import { anchorOf } from './geometry/anchors';
import type { Point } from './geometry/outline';
import { alongTheCar, shapesOf, USUAL_PLACES } from './geometry/place-shapes';
import { withinReach } from './geometry/reach';
import { placeKey, placeName } from './place-words';
import type { UndersidePlace } from './underside-input';

/** A place offered in words. */
export interface Offer {
  readonly key: string;
  readonly place: UndersidePlace;
  /** As it is read; the side is left out where all that is offered lies on one. */
  readonly words: string;
  /** As it is heard. */
  readonly name: string;
}

/** Places that can be touched, in the order of the arrow keys. */
export const TOUCHABLE = alongTheCar(USUAL_PLACES).map((place) => ({
  place,
  key: placeKey(place),
  shapes: shapesOf(place.zone, place.side),
}));

/** Whether two places are the same. */
export function isSame(one: UndersidePlace | null, other: UndersidePlace | null): boolean {
  return one?.zone === other?.zone && one?.side === other?.side;
}

/** Where the car has the zone only by a finding's word: the left of the boot floor, the middle of the floor. */
export function isUnusual({ zone, side }: UndersidePlace): boolean {
  return !naturalSides(zone).includes(side);
}

/**
 * What a touch offers, nearest first. Without a touch, what lies about the chosen place. The chosen place is always among them,
 * so that it is seen in words wherever it was set.
 */
export function offersFor(
  touch: Point | null,
  place: UndersidePlace | null,
  reach: number,
): readonly Offer[] {
  const at = touch ?? (place ? anchorOf(place.zone, place.side) : null);
  if (!at) return [];
  const near: UndersidePlace[] = withinReach(TOUCHABLE, at, reach).map((each) => each.place);
  if (place && !near.some((each) => isSame(each, place))) near.unshift(place);
  const sides = new Set(near.map(({ side }) => side));
  return near.map((each) => ({
    key: placeKey(each),
    place: each,
    words: sides.size === 1 ? ZONE_NAMES[each.zone] : placeName(each),
    name: placeName(each),
  }));
}

/** The question over what is offered: "Third finding, left side: which zone?" */
export function question(heading: string, offers: readonly Offer[], touch: Point | null): string {
  if (offers.length === 0) {
    return touch
      ? `${heading}: nothing within reach there, touch the car nearer to it.`
      : `${heading}: touch the car where the rust is.`;
  }
  const sides = new Set(offers.map(({ place }) => place.side));
  const [only] = [...sides];
  return sides.size === 1
    ? `${heading}, ${sideWords(only!)}: which zone?`
    : `${heading}: which zone?`;
}

/** A side in a sentence. */
export function sideWords(side: Side): string {
  return side === 'centre' ? 'middle of the car' : `${SIDE_NAMES[side]} side`;
}

/** The zones whose side a touch cannot tell: on the middle of the car, or with a middle of their own. */
export function asksForSide(place: UndersidePlace | null): place is UndersidePlace {
  return (
    place !== null &&
    (place.zone === 'floor' || naturalSides(place.zone).length === 1 || isUnusual(place))
  );
}

import { ChangeDetectionStrategy, Component, computed, input, model, signal } from '@angular/core';
import { SIDES } from '#shared/domain/vocabulary';
import { measuredWidth } from '../charts/measured-width';
import { SIDE_NAMES } from '../ui/words';
import { drawnFindings } from './drawn-findings';
import { CAR, type Point } from './geometry/outline';
import { shapesOf } from './geometry/place-shapes';
import { distanceTo } from './geometry/reach';
import { layOutMarks } from './marks-layout';
import { asksForSide, isSame, isUnusual, offersFor, question, TOUCHABLE } from './pick-places';
import { placeKey, placeName } from './place-words';
import { UndersideCar, type DrawnPlace, type Touch } from './underside-car';
import type { UndersideFinding, UndersidePlace } from './underside-input';
import { UndersideMarksLayer } from './underside-marks-layer';
import { UndersidePickList } from './underside-pick-list';

/** Radius in CSS px within which a touch offers zones: a finger in a glove. */
const REACH = 23;
const MARK = { width: 21, height: 21 };
const WIDEST_CAR = 640;
let picks = 0;

/** Where a finding is: touched on the car seen from below, or picked from a list. The two are one control. */
@Component({
  selector: 'us-underside-pick',
  imports: [UndersideCar, UndersideMarksLayer, UndersidePickList],
  templateUrl: './underside-pick.html',
  styleUrl: './underside-pick.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersidePick {
  readonly place = model<UndersidePlace | null>(null);
  /** Which of the two ways is shown. */
  readonly view = model<'picture' | 'list'>('picture');
  /** Findings set before, numbered on the map in the order given. */
  readonly findings = input<readonly UndersideFinding[]>([]);
  /** `elsewhere`: whoever uses it has the switch between picture and list in its own head. */
  readonly switching = input<'here' | 'elsewhere'>('here');
  /** What is being placed: "Third finding". */
  readonly heading = input('Finding');

  protected readonly id = `us-underside-pick-${++picks}`;
  protected readonly reach = REACH;
  protected readonly sides = SIDES.map((side) => ({ side, words: SIDE_NAMES[side] }));
  private readonly width = measuredWidth();
  /** Where the last touch landed, in the drawing's units. */
  private readonly touch = signal<Point | null>(null);

  protected readonly car = computed(() => {
    const width = Math.min(WIDEST_CAR, this.width());
    return { x: 0, y: 0, width, height: (width * CAR.height) / CAR.width };
  });
  private readonly scale = computed(() => this.car().width / CAR.width);
  protected readonly key = computed(() => {
    const place = this.place();
    return place ? placeKey(place) : null;
  });
  protected readonly places = computed((): readonly DrawnPlace[] => {
    const found = new Map(drawnFindings(this.findings()).map((each) => [each.key, each]));
    const place = this.place();
    const odd =
      place && isUnusual(place)
        ? [{ place, key: placeKey(place), shapes: shapesOf(place.zone, place.side) }]
        : [];
    const foundOnly = [...found.values()].filter(
      ({ key }) => !TOUCHABLE.some((each) => each.key === key),
    );
    return [...TOUCHABLE, ...odd]
      .map(({ place: each, key, shapes }) => ({
        key,
        shapes,
        name: placeName(each),
        look: isSame(each, place) ? ('chosen' as const) : (found.get(key)?.look ?? 'blank'),
      }))
      .concat(foundOnly.filter(({ key }) => key !== this.key()));
  });
  protected readonly marks = computed(() => layOutMarks(this.findings(), this.car(), MARK));
  protected readonly ring = computed((): Point | null => {
    const touch = this.touch();
    return touch && [touch[0] * this.scale(), touch[1] * this.scale()];
  });
  protected readonly offers = computed(() =>
    offersFor(this.touch(), this.place(), REACH / (this.scale() || 1)),
  );
  protected readonly question = computed(() =>
    question(this.heading(), this.offers(), this.touch()),
  );
  protected readonly sideAsked = computed(() => {
    const place = this.place();
    return asksForSide(place) ? place : undefined;
  });

  /** Whether a touch has asked which zone is meant and no answer is given yet. */
  readonly asks = computed(() => this.touch() !== null && this.place() === null);

  /** Another finding is looked at: where the car was touched for the one before says nothing of it. */
  forgetTouch(): void {
    this.touch.set(null);
  }

  /** A touch asks which of the zones in reach is meant, unless there is only one, or a mouse has pointed at one. */
  protected land({ point, key, pointer }: Touch): void {
    this.touch.set(point);
    this.place.set(null);
    const offers = this.offers();
    const under = TOUCHABLE.find((each) => each.key === key);
    const sure =
      pointer === 'mouse' && under && under.shapes.some((shape) => distanceTo(shape, point) === 0);
    if (sure) this.place.set(under.place);
    else if (offers.length === 1) this.place.set(offers[0]!.place);
  }

  protected pressed(key: string): void {
    const found = TOUCHABLE.find((each) => each.key === key);
    if (found) this.pick(found.place);
  }

  /** Picked in words or by keyboard: the ring of an earlier touch elsewhere goes. */
  protected pick(place: UndersidePlace): void {
    const offered = this.offers().some((offer) => isSame(offer.place, place));
    if (!offered) this.touch.set(null);
    this.place.set(place);
  }
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../charts/measured-width';
import { ConditionSign } from '../ui/condition-sign/condition-sign';
import { drawnFindings } from './drawn-findings';
import { isLeftDangerous } from '#shared/domain/danger';
import { findingWords, graverOf } from './finding-words';
import { CAR } from './geometry/outline';
import { layOutMarks } from './marks-layout';
import { placeName } from './place-words';
import { UndersideCar } from './underside-car';
import type { UndersideFinding } from './underside-input';
import { UndersideMarksLayer } from './underside-marks-layer';

const MARKS = {
  signed: { width: 48, height: 22 },
  numbered: { width: 21, height: 21 },
} as const;
/** A car narrower than this is drawn plain, its marks without their signs. */
const FULL_FROM = 480;
/** From this width of the whole on, the list stands beside the car, not below it. */
const BESIDE_FROM = 720;
const WIDEST_CAR = 640;

/** The findings of one job on the car seen from below, numbered in the order given, with their words in a list beside. */
@Component({
  selector: 'us-underside-marks',
  imports: [ConditionSign, UndersideCar, UndersideMarksLayer],
  templateUrl: './underside-marks.html',
  styleUrl: './underside-marks.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideMarks {
  readonly findings = input.required<readonly UndersideFinding[]>();
  /** `none` where the page has a list of its own, numbered in the same order and with the words for danger. */
  readonly list = input<'beside' | 'none'>('beside');

  private readonly width = measuredWidth();
  protected readonly beside = computed(
    () => this.list() === 'beside' && this.width() >= BESIDE_FROM,
  );
  protected readonly car = computed(() => {
    const room = this.beside() ? Math.floor(this.width() * 0.56) : this.width();
    const width = Math.min(WIDEST_CAR, room);
    return { x: 0, y: 0, width, height: (width * CAR.height) / CAR.width };
  });
  protected readonly places = computed(() => drawnFindings(this.findings()));
  protected readonly plain = computed(() => this.car().width < FULL_FROM);
  protected readonly kind = computed(() => (this.plain() ? 'numbered' : 'signed'));
  protected readonly marks = computed(() =>
    layOutMarks(this.findings(), this.car(), MARKS[this.kind()]),
  );
  protected readonly rows = computed(() =>
    this.findings().map((finding, index) => ({
      ref: finding.ref,
      number: index + 1,
      place: placeName(finding),
      condition: graverOf(finding),
      words: findingWords(finding),
      structural: finding.structural,
      dangerous: isLeftDangerous(finding),
    })),
  );
  protected readonly summary = computed(() => {
    const places = this.rows().map(({ number, place }) => `${number} ${place}`);
    return places.length === 0
      ? 'The car seen from below: nothing found.'
      : `Findings on the car, seen from below: ${places.join('; ')}.`;
  });
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { measuredWidth } from '../measured-width';
import { hatchWords, textWidth } from '../text-width';
import type { AgeRegionInput } from './age-region-input';
import { layOutAgeRegion } from './age-region-layout';

let charts = 0;

/** Shares of cars by age, a small picture a region: dot and 95 % interval against a reference, too few cars hatched. */
@Component({
  selector: 'us-age-region-chart',
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './age-region-chart.html',
  styleUrl: './age-region-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 31 + 170' },
})
export class AgeRegionChart {
  readonly data = input.required<AgeRegionInput>();

  private readonly width = measuredWidth();
  protected readonly hatch = `us-hatch-age-region-${++charts}`;
  protected readonly picture = computed(() =>
    this.width() > 0 ? layOutAgeRegion(this.data(), this.width()) : undefined,
  );
  protected readonly words = 'too few';
  protected readonly wordsWidth = hatchWords(this.words);

  /** Where the quiet interval begins that follows the strong share. */
  protected after(text: string): number {
    return textWidth(`${text} `, 600) + 1;
  }
}

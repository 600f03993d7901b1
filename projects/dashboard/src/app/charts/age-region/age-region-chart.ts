import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { laidOut } from '../laid-out';
import { Hatch } from '../pieces/hatch';
import { Picture } from '../pieces/picture';
import { TooFew } from '../pieces/too-few';
import { hatchWords, textWidth } from '../text-width';
import type { AgeRegionInput } from './age-region-input';
import { layOutAgeRegion } from './age-region-layout';

/** Shares of cars by age, a small picture a region: dot and 95 % interval against a reference, too few cars hatched. */
@Component({
  selector: 'us-age-region-chart',
  imports: [Hatch, Picture, TooFew],
  changeDetection: ChangeDetectionStrategy.OnPush,
  templateUrl: './age-region-chart.html',
  styleUrl: './age-region-chart.scss',
  host: { '[style.min-height.px]': 'data().rows.length * 31 + 170' },
})
export class AgeRegionChart {
  readonly data = input.required<AgeRegionInput>();

  protected readonly picture = laidOut(this.data, layOutAgeRegion);
  protected readonly words = 'too few';
  protected readonly wordsWidth = hatchWords(this.words);

  /** Where the quiet interval begins that follows the strong share. */
  protected after(text: string): number {
    return textWidth(`${text} `, 600) + 1;
  }
}

import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { Hatch } from '../charts/pieces/hatch';
import { formatNumber } from '../ui/format';
import { TOO_FEW } from './place-words';
import { CLASS_BOUNDS } from './share-scale';

/** The scale of shares with its numbers, and the hatching for too few cars. */
@Component({
  selector: 'us-underside-legend',
  imports: [Hatch],
  template: `
    <svg aria-hidden="true" height="34" [attr.width]="6 * step() + 4">
      @for (bound of bounds; track bound) {
        <rect
          y="1"
          height="12"
          [attr.class]="'step-' + $index"
          [attr.x]="0.5 + $index * step()"
          [attr.width]="step()"
        />
        <text y="26" [attr.x]="$index * step()" [attr.text-anchor]="$first ? 'start' : 'middle'">
          {{ numbers[$index] }}
        </text>
      }
    </svg>
    <span class="words">% of cars; each step doubles</span>
    <span class="few-words">
      <svg aria-hidden="true" width="41" height="14">
        <defs><pattern us-hatch #hatch="usHatch" /></defs>
        <rect class="swatch" x=".5" y="1" width="40" height="12" [style.fill]="hatch.fill" />
      </svg>
      {{ tooFew }}
    </span>
  `,
  styleUrl: './underside-legend.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideLegend {
  /** Width of one step of the scale in px. */
  readonly step = input(62);
  protected readonly bounds = CLASS_BOUNDS;
  protected readonly numbers = CLASS_BOUNDS.map((bound) =>
    formatNumber(bound * 100, Number.isInteger(bound * 100) ? 0 : 1),
  );
  protected readonly tooFew = TOO_FEW;
}

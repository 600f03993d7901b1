import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { corrosivityWords } from './corrosivity-words';
import type { Climate } from './region-changes';

/** The corrosivity of a region's air as one types it, with its category and where both come from. */
@Component({
  selector: 'us-corrosivity',
  template: `
    <div aria-live="polite">
      @if (words(); as said) {
        <p>
          Bare steel would lose <strong>{{ said.rate }}</strong> there in its first year:
          {{ said.category }}.
        </p>
        @if (said.caveat) {
          <p class="us-quiet">{{ said.caveat }}</p>
        }
      } @else {
        <p>
          How corrosive the air is stands here as soon as all four means are typed. A region works
          without them.
        </p>
      }
    </div>
    <p class="us-quiet">
      ISO 9223, first-year corrosion of carbon steel in open air, from the four means. It compares
      places; it knows nothing of road salt thrown into a cavity.
    </p>
  `,
  styles: `
    :host {
      display: block;
      font-size: 14px;
      line-height: 20px;
    }
    p {
      max-width: 420px;
      margin-bottom: 6px;
    }
    strong {
      font-weight: 600;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Corrosivity {
  /** Nothing while a mean is missing or out of reach. */
  readonly climate = input<Climate>();
  protected readonly words = computed(() => {
    const climate = this.climate();
    return climate && corrosivityWords(climate);
  });
}

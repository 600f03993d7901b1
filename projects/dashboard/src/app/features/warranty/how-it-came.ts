import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  contentChild,
  input,
  signal,
  TemplateRef,
} from '@angular/core';

/** Opens what a figure was worked out from, so that it can be redone by hand. Its content is a template, made when it is opened. */
@Component({
  selector: 'us-how-it-came',
  imports: [NgTemplateOutlet],
  template: `
    <button
      type="button"
      class="us-action us-unprinted"
      [attr.aria-expanded]="stand() === 'open'"
      (click)="stand.set(stand() === 'open' ? 'closed' : 'open')"
    >
      How this came about<span class="us-unseen">: {{ of() }}</span>
    </button>
    @if (stand() === 'open') {
      <div class="sums"><ng-container [ngTemplateOutlet]="sums()" /></div>
    }
  `,
  styles: `
    :host {
      display: block;
      min-width: 0;
    }
    .sums {
      margin-top: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HowItCame {
  /** The figure, for those who hear the button. */
  readonly of = input.required<string>();
  protected readonly sums = contentChild.required(TemplateRef);
  protected readonly stand = signal<'open' | 'closed'>('closed');
}

import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { objectUrl } from './object-url';
import type { ShownPhoto } from './shown-photo';

/** One photo, small or whole. */
@Component({
  selector: 'us-photo',
  template: `
    @let it = picture();
    @if (it.kind === 'there') {
      <img [src]="it.url" [alt]="photo().alt" [class]="size()" />
    } @else {
      <span class="none" [class]="size()">{{
        it.kind === 'coming' ? 'Photo is coming' : photo().alt + ' cannot be shown just now'
      }}</span>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    .small {
      display: block;
      width: 88px;
      height: 88px;
      object-fit: cover;
      border: 1px solid var(--us-zinc);
      border-radius: var(--us-radius);
      background: var(--us-pointer);
    }
    .whole {
      display: block;
      max-width: 100%;
      max-height: 75vh;
      margin: 0 auto;
    }
    .none {
      overflow: hidden;
      padding: 6px;
      color: var(--us-quiet);
      font-size: 14px;
      line-height: 18px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Photo {
  readonly photo = input.required<ShownPhoto>();
  readonly size = input<'small' | 'whole'>('small');
  protected readonly picture = objectUrl(() => this.photo().load(this.size()));
}

import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Drafts } from '../../../core/drafts/drafts';
import { JobOutbox } from '../../../core/drafts/outbox';
import { deviceWord } from '../../../ui/device-word';
import { formatCount, formatCounted } from '../../../ui/format';
import { Trouble } from '../../../ui/trouble/trouble';

/** Where what is written stands, always in sight: kept on this phone, and how much waits to be sent. */
@Component({
  selector: 'us-kept-line',
  imports: [Trouble],
  template: `
    @if (drafts.trouble(); as trouble) {
      <us-trouble role="alert">{{ trouble }}</us-trouble>
    } @else {
      <p role="status">
        <svg viewBox="0 0 12 16" aria-hidden="true">
          <path d="M1.5 1h9v14h-9ZM5 12.5h2" />
        </svg>
        {{ words() }}
      </p>
    }
  `,
  styles: `
    p {
      display: flex;
      align-items: center;
      gap: 8px;
      color: var(--us-tide);
      font: 500 14px/20px var(--us-font);
    }
    svg {
      flex: none;
      width: 12px;
      height: 16px;
      fill: none;
      stroke: currentColor;
      stroke-width: 1.5;
      stroke-linejoin: round;
      stroke-linecap: round;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KeptLine {
  protected readonly drafts = inject(Drafts);
  private readonly outbox = inject(JobOutbox).state;
  private readonly device = deviceWord();
  protected readonly words = computed(() => {
    const { waiting, refused, photosWaiting, line, signedOut } = this.outbox();
    return [
      `Kept on this ${this.device()}`,
      ...(waiting > 0 ? [`${formatCount(waiting)} waiting to be sent`] : []),
      ...(photosWaiting > 0 ? [`${formatCounted(photosWaiting, 'photo', 'photos')} to go`] : []),
      ...(refused > 0 ? [`${formatCount(refused)} refused`] : []),
      ...(line === 'down' ? ['no line just now'] : []),
      ...(signedOut && waiting + photosWaiting > 0 ? ['sign in to send'] : []),
    ].join(', ');
  });
}

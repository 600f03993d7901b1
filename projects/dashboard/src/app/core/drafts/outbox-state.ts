import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { RouterLink } from '@angular/router';
import { deviceWord } from '../../ui/device-word';
import { Drafts } from './drafts';
import { JobOutbox } from './outbox';
import { outboxWords } from './outbox-words';
import { UnsentHere } from './unsent-here';

/** What lies on this device and where its sending stands, always with the phone's sign and in words; leads to *Send a job*. */
@Component({
  selector: 'us-outbox-state',
  imports: [RouterLink],
  template: `
    <!-- Around the link, whose name a live region inside it would take away. -->
    <div role="status">
      <a
        [routerLink]="signIn() ? '/sign-in' : '/send'"
        [queryParams]="query()"
        [class]="told().tone"
      >
        <svg viewBox="0 0 12 16" aria-hidden="true">
          <rect x="1" y="1" width="10" height="14" rx="2" />
          <path d="M5 12.5h2" />
        </svg>
        {{ sentence() }}
      </a>
    </div>
    @for (said of troubles(); track said) {
      <p role="alert">{{ said }}</p>
    }
  `,
  styles: `
    :host {
      display: block;
    }
    a {
      display: inline-flex;
      align-items: center;
      gap: 8px;
      min-height: 44px;
      color: var(--us-tide);
      font: 500 14px/20px var(--us-font);
    }
    a.attention {
      color: var(--us-oxide);
    }
    svg {
      flex: none;
      width: 12px;
      height: 16px;
      fill: none;
      stroke: currentColor;
      stroke-width: 1.5;
      stroke-linecap: round;
    }
    p {
      padding-bottom: 10px;
      color: var(--us-oxide);
      font: 500 14px/20px var(--us-font);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class OutboxStateLine {
  private readonly drafts = inject(Drafts);
  private readonly outbox = inject(JobOutbox);
  private readonly unsent = inject(UnsentHere);
  private readonly device = deviceWord();

  protected readonly told = computed(() =>
    outboxWords(this.outbox.state(), this.unsent.mine().editing, this.device()),
  );
  protected readonly sentence = computed(() => {
    const sentence = this.told().words.join(', ');
    return sentence.charAt(0).toUpperCase() + sentence.slice(1);
  });
  protected readonly signIn = computed(() => this.outbox.state().signedOut);
  protected readonly query = computed(() => (this.signIn() ? { next: '/send' } : {}));
  protected readonly troubles = computed(() =>
    [this.drafts.trouble(), this.drafts.notice()].filter((said) => said !== undefined),
  );
}

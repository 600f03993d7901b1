import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { ComeBack } from '#shared/contracts/come-back';
import { isDangerous } from '#shared/domain/danger';
import { Session } from '../../core/session/session';
import { ComeBackDrafts } from '../../ui/come-back/come-back-drafts';
import { ComeBackForm } from '../../ui/come-back/come-back-form';
import { keyOfFinding } from '../../ui/come-back/come-back-words';
import { formatShortDate } from '../../ui/format';
import { COME_BACK_STATUS_NAMES } from '../../ui/words';

/** How a finding that was left stands since, under its line; whoever may mark it does so here. */
@Component({
  selector: 'us-left-mark',
  imports: [ComeBackForm, RouterLink],
  template: `
    <p>
      <span class="us-quiet">since then:</span> {{ words() }}
      @if (of().closedByJobRef; as later) {
        <a [routerLink]="['/jobs', of().branch, later]">job {{ later }}</a>
      }
      @if (mayMark()) {
        <button
          type="button"
          class="us-action us-unprinted"
          [attr.aria-expanded]="open()"
          [attr.aria-label]="action() + ': ' + place()"
          (click)="open.set(!open())"
        >
          {{ action() }}
        </button>
      }
    </p>
    @if (open()) {
      <us-come-back-form
        class="us-unprinted"
        [of]="of()"
        [today]="today()"
        (marked)="done($event)"
        (leave)="open.set(false)"
      />
    }
  `,
  styles: `
    :host {
      display: block;
    }
    p {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 0 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LeftMark {
  readonly of = input.required<ComeBack>();
  /** Where it is, for those who hear the button. */
  readonly place = input.required<string>();
  readonly today = input.required<string>();
  readonly marked = output<ComeBack>();

  private readonly role = inject(Session).role;
  private readonly drafts = inject(ComeBackDrafts);
  protected readonly open = signal(false);
  protected readonly mayMark = computed(() => {
    const role = this.role();
    if (role === 'recorder') return !['done', 'gone'].includes(this.of().status);
    return role === 'site_manager' || role === 'head_office';
  });
  protected readonly words = computed(() => {
    const { status, dueOn, ownerToldOn, closedByJobRef } = this.of();
    if (closedByJobRef) return 'dealt with by a later job,';
    return [
      COME_BACK_STATUS_NAMES[status],
      ...(dueOn ? [`due ${formatShortDate(dueOn)}`] : []),
      ownerToldOn
        ? `owner told in writing on ${formatShortDate(ownerToldOn)}`
        : isDangerous(this.of())
          ? 'owner not told in writing'
          : '',
    ]
      .filter(Boolean)
      .join(', ');
  });

  protected action(): string {
    if (this.open()) return 'Close';
    return this.drafts.read(keyOfFinding(this.of())) ? 'Go on with the draft' : 'Mark';
  }

  protected done(item: ComeBack): void {
    this.open.set(false);
    this.marked.emit(item);
  }
}

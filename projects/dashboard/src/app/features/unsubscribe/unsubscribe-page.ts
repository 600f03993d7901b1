import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { readUnsubscription, unsubscribe } from '#shared/contracts/unsubscribe';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { OuterFrame } from '../../core/shell/outer-frame';
import { LoadState } from '../../ui/load-state/load-state';
import { MAIL_WORDS } from '../../ui/mail-words';
import { Trouble } from '../../ui/trouble/trouble';

/** Where the link at the foot of a mail leads: which mail it stops, one button that does, and what still comes. */
@Component({
  selector: 'us-unsubscribe-page',
  imports: [LoadState, MatButton, OuterFrame, RouterLink, Trouble],
  templateUrl: './unsubscribe-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UnsubscribePage {
  private readonly api = inject(Api);

  /** From the link in the mail. */
  readonly token = input<string>();

  protected readonly standing = this.api.read(readUnsubscription, () => {
    const token = this.token();
    return token ? { query: { token } } : undefined;
  });
  protected readonly stopping = deed(() =>
    this.api.call(unsubscribe, { query: { token: this.token() ?? '' } }),
  );
  protected readonly name = computed(() => {
    const kind = this.standing.value()?.kind;
    return kind ? MAIL_WORDS[kind].name : '';
  });
  /** Cut short by a mail program, or of a server that signs with another secret now. */
  protected readonly isBad = computed(
    () => !this.token() || isRefused(this.standing.problem()?.status),
  );
  protected readonly isDone = signal(false);

  protected async stop(): Promise<void> {
    this.isDone.set((await this.stopping.run(undefined)) !== undefined);
  }
}

function isRefused(status: number | undefined): boolean {
  return status === 404 || status === 422;
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
  numberAttribute,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { listMailbox } from '#shared/contracts/system';
import { Api } from '../../core/api/api';
import { formatInstant } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { mailPieces } from './mail-text';

/** Mails kept here because no mail server is set up: a list, and the one opened beside it. */
@Component({
  selector: 'us-mailbox-page',
  imports: [LoadState, RouterLink],
  templateUrl: './mailbox-page.html',
  styleUrl: './mailbox-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MailboxPage {
  private readonly origin = inject(DOCUMENT).location.origin;
  protected readonly mails = inject(Api).read(listMailbox, () => ({}));

  /** Number of the open mail, from the URL. */
  readonly mail = input(undefined, {
    transform: (value: unknown) => (value === undefined ? undefined : numberAttribute(value)),
  });
  protected readonly items = computed(() => this.mails.value()?.items ?? []);
  protected readonly open = computed(() => {
    const mail = this.items().find((one) => one.id === this.mail());
    return mail && { ...mail, pieces: mailPieces(mail.text, this.origin) };
  });
  /** With a mail server the mailbox does not exist. */
  protected readonly sent = computed(() => this.mails.problem()?.status === 404);
  protected readonly time = formatInstant;
}

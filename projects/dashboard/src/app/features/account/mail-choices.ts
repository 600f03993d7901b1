import { ChangeDetectionStrategy, Component, computed, inject, linkedSignal } from '@angular/core';
import { MatCheckbox } from '@angular/material/checkbox';
import { chooseMails, listMailChoices } from '#shared/contracts/auth';
import type { MailKind } from '#shared/domain/mail-kinds';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';
import { MAIL_WORDS } from '../../ui/mail-words';

/** Which mails one wants: a tick each, kept as soon as it is set. */
@Component({
  selector: 'us-mail-choices',
  imports: [LoadState, MatCheckbox, Trouble],
  templateUrl: './mail-choices.html',
  styleUrl: './mail-choices.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MailChoices {
  private readonly api = inject(Api);
  protected readonly choices = this.api.read(listMailChoices, () => ({}));
  /** As ticked; goes back to what is kept when keeping it failed. */
  private readonly items = linkedSignal(() => this.choices.value()?.items ?? []);
  protected readonly rows = computed(() =>
    this.items().map(({ kind, wanted }) => ({ kind, wanted, ...MAIL_WORDS[kind] })),
  );
  protected readonly keeping = deed((item: { kind: MailKind; wanted: boolean }) =>
    this.api.call(chooseMails, { body: { items: [item] } }),
  );
  /** What was kept last, in words. */
  protected readonly kept = linkedSignal<unknown, string>({
    source: this.choices.value,
    computation: () => '',
  });

  protected async choose(kind: MailKind, wanted: boolean): Promise<void> {
    const before = this.items();
    this.kept.set('');
    this.items.set(before.map((item) => (item.kind === kind ? { kind, wanted } : item)));
    const answer = await this.keeping.run({ kind, wanted });
    this.items.set(answer?.body.items ?? before);
    if (answer) {
      this.kept.set(`Kept: “${MAIL_WORDS[kind].name}” ${wanted ? 'comes' : 'no longer comes'}.`);
    }
  }
}

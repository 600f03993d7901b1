import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import type { OutOf } from '#shared/contracts/endpoint';
import { type addKey, listKeys, revokeKey } from '#shared/contracts/push-keys';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { CellTemplate } from '../../ui/data-table/cell-template';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatInstant, formatInstantDay } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { keyChange } from '../../ui/set-up/branch-changes';
import { ChangeForm } from '../../ui/set-up/change-form';
import { NewKey } from '../../ui/set-up/new-key';
import { Trouble } from '../../ui/trouble/trouble';

type PushKey = OutOf<typeof listKeys>['items'][number];

const COLUMNS: readonly Column<PushKey>[] = [
  { key: 'label', label: 'For', text: ({ label }) => label },
  { key: 'made', label: 'Made', text: ({ createdAt }) => formatInstantDay(createdAt) },
  {
    key: 'used',
    label: 'Last used',
    text: ({ lastUsedAt }) => (lastUsedAt ? formatInstant(lastUsedAt) : 'never'),
    muted: ({ lastUsedAt }) => lastUsedAt === null,
  },
  { key: 'revoke', label: 'Revoke', unseenLabel: true, text: () => '' },
];

/** Keys with which a branch's own system sends its jobs; a new one is shown once. */
@Component({
  selector: 'us-branch-keys',
  imports: [CellTemplate, ChangeForm, DataTable, LoadState, NewKey, Trouble],
  templateUrl: './branch-keys.html',
  styles: `
    p,
    us-data-table,
    us-new-key {
      margin-bottom: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BranchKeys {
  readonly branch = input.required<string>();

  private readonly api = inject(Api);
  protected readonly columns = COLUMNS;
  protected readonly day = formatInstantDay;
  protected readonly keys = this.api.read(listKeys, () => ({ params: { branch: this.branch() } }));
  protected readonly made = signal<OutOf<typeof addKey> | undefined>(undefined);
  /** The key whose revoking was asked for once: it cannot be undone, so it takes a second press. */
  protected readonly asked = signal<string | undefined>(undefined);
  protected readonly form = computed(() => keyChange(this.api, this.branch()));
  protected readonly revoking = deed((id: string) =>
    this.api.call(revokeKey, { params: { branch: this.branch(), id } }),
  );

  protected took(key: OutOf<typeof addKey>): void {
    this.made.set(key);
    this.keys.reload();
  }

  protected async revoke({ id }: PushKey): Promise<void> {
    if (this.asked() !== id) {
      this.asked.set(id);
      return;
    }
    this.asked.set(undefined);
    if (!(await this.revoking.run(id))) return;
    if (this.made()?.id === id) this.made.set(undefined);
    this.keys.reload();
  }
}

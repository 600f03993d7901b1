import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { OutOf } from '#shared/contracts/endpoint';
import { listImports } from '#shared/contracts/imports';
import { Api } from '../../core/api/api';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatCount, formatInstant } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { KIND_NAMES, STATE_NAMES, writtenOf } from './import-words';

type EarlierFile = OutOf<typeof listImports>['items'][number];

const COLUMNS: readonly Column<EarlierFile>[] = [
  {
    key: 'name',
    label: 'File',
    text: (row) => row.fileName,
    quiet: (row) => KIND_NAMES[row.kind],
    link: (row) => ({ commands: [], query: { branch: row.branch, file: row.id } }),
  },
  { key: 'state', label: 'Stands', text: (row) => STATE_NAMES[row.state] },
  { key: 'rows', label: 'Rows', kind: 'number', text: (row) => formatCount(row.counts.rows) },
  { key: 'written', label: 'Written', kind: 'number', text: (row) => formatCount(writtenOf(row)) },
  {
    key: 'refused',
    label: 'Refused',
    kind: 'number',
    text: (row) => formatCount(row.counts.refused),
  },
  { key: 'by', label: 'Sent by', text: (row) => row.by },
  { key: 'when', label: 'When', text: (row) => formatInstant(row.receivedAt) },
];

/** The files sent for a branch, the newest first; each opens again where it stands. */
@Component({
  selector: 'us-earlier-files',
  imports: [DataTable, LoadState],
  template: `
    <section [attr.aria-label]="heading()">
      <h2>{{ heading() }}</h2>
      <us-load-state [of]="files" [empty]="rows().length === 0" shape="rows">
        <p usEmpty class="us-small us-quiet">None yet.</p>
        <us-data-table [label]="heading()" [columns]="columns" [rows]="rows()" />
      </us-load-state>
    </section>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EarlierFiles {
  readonly branch = input.required<string>();
  readonly name = input.required<string>();
  protected readonly heading = computed(() => `Files of ${this.name()} before`);
  protected readonly columns = COLUMNS;
  protected readonly files = inject(Api).read(listImports, () => ({
    params: { branch: this.branch() },
  }));
  protected readonly rows = computed(() => this.files.value()?.items ?? []);
}

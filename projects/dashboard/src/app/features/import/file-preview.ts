import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { ImportedFile } from '#shared/contracts/imports';
import { CellTemplate } from '../../ui/data-table/cell-template';
import { DataTable } from '../../ui/data-table/data-table';
import { formatCount } from '../../ui/format';
import { previewColumns, reasons, REFUSED_COLUMNS } from './preview-rows';
import { RowStatus } from './row-status';

/** The first rows of a file with what each would do, and the refused ones with their reasons; between its tags what fetches them. */
@Component({
  selector: 'us-file-preview',
  imports: [CellTemplate, DataTable, RowStatus],
  templateUrl: './file-preview.html',
  styleUrl: './file-preview.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FilePreview {
  readonly file = input.required<ImportedFile>();
  readonly rows = input<'all' | 'refused'>('all');

  protected readonly columns = computed(() => previewColumns(this.file()));
  protected readonly firstHeading = computed(
    () =>
      `The first ${formatCount(this.file().preview.length)} of ${formatCount(this.file().counts.rows)} rows`,
  );
  protected readonly reasons = reasons;
  protected readonly refusedColumns = REFUSED_COLUMNS;
  protected readonly refusedNote = computed(() => {
    const shown = this.file().refusedPreview.length;
    const refused = this.file().counts.refused;
    return shown < refused ? `The first ${formatCount(shown)} of ${formatCount(refused)}` : '';
  });
}

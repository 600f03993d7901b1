import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';
import type { Column } from '../data-table/column';
import { DataTable } from '../data-table/data-table';
import { DefinitionLink } from '../definition-link/definition-link';

/**
 * A picture with its title, the method in one breath, its finding in words for those who do not see it, and the same figures as a
 * table one press away. Goes inside a sheet; the picture is its content.
 */
@Component({
  selector: 'us-table-twin',
  imports: [DataTable, DefinitionLink],
  templateUrl: './table-twin.html',
  styleUrl: './table-twin.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TableTwin<Row> {
  /** Names the thing and its unit: "Margin week by week, %". */
  readonly heading = input.required<string>();
  /** The quiet line below: the method in one breath. */
  readonly note = input('');
  /** The picture's finding as a sentence. */
  readonly finding = input.required<string>();
  readonly columns = input.required<readonly Column<Row>[]>();
  readonly rows = input.required<readonly Row[]>();
  /** Anchor of the definition on "How it is counted". */
  readonly definition = input<string>();
  protected readonly asTable = signal(false);
}

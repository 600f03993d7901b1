import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Endpoint } from '#shared/contracts/endpoint';
import { FileLink } from './file-link';

/** Words that fetch the rows of a table as a CSV file: "CSV of these 11 rows". Says how far it is and can be cancelled. */
@Component({
  selector: 'us-csv-link',
  imports: [FileLink],
  template: `
    <us-file-link
      [endpoint]="endpoint()"
      [query]="query()"
      [params]="params()"
      [words]="words()"
      [name]="name()"
    />
  `,
  styles: `
    :host {
      display: inline-flex;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CsvLink {
  readonly endpoint = input.required<Endpoint>();
  /** The filters of the screen, so that the file holds exactly its rows. */
  readonly query = input<Readonly<Record<string, unknown>>>({});
  /** What the `:names` of its path are. */
  readonly params = input<Readonly<Record<string, unknown>>>();
  readonly words = input.required<string>();

  protected readonly name = computed(
    () => `underseam-${this.endpoint().path.split('/').at(-1) ?? 'rows.csv'}`,
  );
}

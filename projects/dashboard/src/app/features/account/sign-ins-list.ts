import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import * as auth from '#shared/contracts/auth';
import type { OutOf } from '#shared/contracts/endpoint';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Session } from '../../core/session/session';
import { CellTemplate } from '../../ui/data-table/cell-template';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatInstant } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { Trouble } from '../../ui/trouble/trouble';

type OpenSignIn = OutOf<typeof auth.listSignIns>['items'][number];

const COLUMNS: readonly Column<OpenSignIn>[] = [
  {
    key: 'device',
    label: 'Device',
    text: (row) => deviceWords(row.device),
    quiet: (row) => (row.current ? 'this one' : undefined),
  },
  { key: 'used', label: 'Last used', text: (row) => formatInstant(row.lastUsedAt) },
  { key: 'started', label: 'Signed in', text: (row) => formatInstant(row.startedAt) },
  {
    key: 'named',
    label: 'As the browser names itself',
    text: (row) => row.device,
    muted: () => true,
  },
];

/** The own open sign-ins, and the way out of all of them. */
@Component({
  selector: 'us-sign-ins-list',
  imports: [CellTemplate, DataTable, LoadState, MatButton, Trouble],
  template: `
    <us-load-state [of]="signIns" shape="rows">
      <us-data-table
        label="Where you are signed in"
        [columns]="columns"
        [rows]="signIns.value()?.items ?? []"
      >
        <ng-template usCell="named" let-row>
          <span class="named">{{ row.device }}</span>
        </ng-template>
      </us-data-table>
    </us-load-state>
    @if (leaving.problem(); as problem) {
      <us-trouble role="alert">{{ problem.sentence }}</us-trouble>
    }
    <button
      class="out"
      matButton="outlined"
      type="button"
      [disabled]="leaving.busy()"
      (click)="leave()"
    >
      Sign out everywhere, here too
    </button>
  `,
  styles: `
    // Browsers name themselves at length: on lines of its own, so that the table need not scroll for it.
    .named {
      display: block;
      min-width: 260px;
      white-space: normal;
    }
    .out {
      margin-top: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInsList {
  private readonly api = inject(Api);
  private readonly session = inject(Session);
  protected readonly columns = COLUMNS;
  protected readonly signIns = this.api.read(auth.listSignIns, () => ({}));
  protected readonly leaving = deed(() => this.api.call(auth.endSignIns, {}));

  protected async leave(): Promise<void> {
    if (await this.leaving.run(undefined)) this.session.end();
  }
}

/** A phone or a computer, by the one word that browsers on phones agree on ("Mobi", as MDN advises in "Browser detection using the user agent"). */
function deviceWords(userAgent: string): string {
  return /Mobi/.test(userAgent) ? 'a phone' : 'a computer';
}

import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { issueWarrantyReport, type IssuedReport } from '#shared/contracts/warranty-reports';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { formatDate } from '../../ui/format';
import { Trouble } from '../../ui/trouble/trouble';

/** Asks before a report is issued, and issues it. Closes with the report as issued. */
@Component({
  selector: 'us-issue-dialog',
  imports: [MatButton, MatDialogModule, Trouble],
  template: `
    <h2 mat-dialog-title>Issue the report as of {{ day }}?</h2>
    <mat-dialog-content>
      <p>
        It is made from what is stored now, gets the next number and is kept unchanged: its figures,
        its rows and its PDF. It cannot be changed or taken back; what arrives later for its period
        is listed beside it.
      </p>
      <div role="alert">
        @if (issuing.problem(); as problem) {
          <us-trouble>{{ problem.sentence }}</us-trouble>
        }
      </div>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton="outlined" type="button" mat-dialog-close>Not now</button>
      <button matButton="filled" type="button" [disabled]="issuing.busy()" (click)="confirm()">
        Issue the report
      </button>
    </mat-dialog-actions>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class IssueDialog {
  private readonly api = inject(Api);
  private readonly dialog = inject<MatDialogRef<IssueDialog, IssuedReport>>(MatDialogRef);
  private readonly asOf = inject<string>(MAT_DIALOG_DATA);
  protected readonly day = formatDate(this.asOf);
  protected readonly issuing = deed(() =>
    this.api.call(issueWarrantyReport, { body: { asOf: this.asOf } }),
  );

  protected async confirm(): Promise<void> {
    const answer = await this.issuing.run(undefined);
    if (answer) this.dialog.close(answer.body);
  }
}

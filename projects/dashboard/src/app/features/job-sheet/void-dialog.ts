import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule, MatDialogRef } from '@angular/material/dialog';
import { voidJob } from '#shared/contracts/jobs';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Trouble } from '../../ui/trouble/trouble';

/** The job to void, as it was read. */
export interface VoidDialogData {
  readonly branch: string;
  readonly jobRef: string;
  /** Of the revision read, so that nobody's later correction is voided unseen. */
  readonly etag: string | undefined;
}

/** Asks before a job is voided, and voids it. Closes with `true` when it was. */
@Component({
  selector: 'us-void-dialog',
  imports: [MatButton, MatDialogModule, Trouble],
  template: `
    <h2 mat-dialog-title>Void job {{ data.jobRef }}?</h2>
    <mat-dialog-content>
      <p>
        It leaves every figure: the week's margin, overruns, rot, claims. It stays in the record and
        can be brought back as it was, at once here or later from Voided jobs.
      </p>
      <div role="alert">
        @if (voiding.problem(); as problem) {
          <us-trouble>{{ problem.sentence }}</us-trouble>
        }
      </div>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton="outlined" type="button" mat-dialog-close>Keep it</button>
      <button matButton="filled" type="button" [disabled]="voiding.busy()" (click)="confirm()">
        Void the job
      </button>
    </mat-dialog-actions>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VoidDialog {
  private readonly api = inject(Api);
  private readonly dialog = inject<MatDialogRef<VoidDialog, boolean>>(MatDialogRef);
  protected readonly data = inject<VoidDialogData>(MAT_DIALOG_DATA);
  protected readonly voiding = deed(() =>
    this.api.call(voidJob, {
      params: { branch: this.data.branch, jobRef: this.data.jobRef },
      headers: this.data.etag ? { 'If-Match': this.data.etag } : {},
    }),
  );

  protected async confirm(): Promise<void> {
    if (await this.voiding.run(undefined)) this.dialog.close(true);
  }
}

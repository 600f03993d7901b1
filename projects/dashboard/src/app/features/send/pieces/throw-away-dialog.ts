import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';
import { formatCounted } from '../../../ui/format';

/** What would be lost. */
export interface ThrownAway {
  readonly car: string;
  readonly photos: number;
}

/** Asks before what is kept on this device is thrown away. Closes with `true` when it is to be. */
@Component({
  selector: 'us-throw-away-dialog',
  imports: [MatButton, MatDialogModule],
  template: `
    <h2 mat-dialog-title>Throw it away?</h2>
    <mat-dialog-content>
      <p>
        What is written here{{ data.car ? ' of the ' + data.car : '' }}{{ photos }} is deleted from
        this device. What was sent, or kept for colleagues, stays.
      </p>
    </mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton="outlined" type="button" mat-dialog-close>Keep it</button>
      <button matButton="filled" type="button" [mat-dialog-close]="true">Throw it away</button>
    </mat-dialog-actions>
  `,
  styles: `
    button {
      min-height: 44px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ThrowAwayDialog {
  protected readonly data = inject<ThrownAway>(MAT_DIALOG_DATA);
  protected readonly photos =
    this.data.photos > 0 ? ` and ${formatCounted(this.data.photos, 'photo', 'photos')}` : '';
}

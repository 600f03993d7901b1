import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MAT_DIALOG_DATA, MatDialogModule } from '@angular/material/dialog';
import { Photo } from './photo';
import type { ShownPhoto } from './shown-photo';

/** One photo as large as the window. */
@Component({
  selector: 'us-photo-dialog',
  imports: [MatButton, MatDialogModule, Photo],
  template: `
    <h2 mat-dialog-title>{{ photo.alt }}</h2>
    <mat-dialog-content><us-photo [photo]="photo" size="whole" /></mat-dialog-content>
    <mat-dialog-actions align="end">
      <button matButton="outlined" type="button" mat-dialog-close>Close</button>
    </mat-dialog-actions>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhotoDialog {
  protected readonly photo = inject<ShownPhoto>(MAT_DIALOG_DATA);
}

import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { MatDialog } from '@angular/material/dialog';
import { Photo } from './photo';
import { PhotoDialog } from './photo-dialog';
import type { ShownPhoto } from './shown-photo';

/** Photos small in a row; large on a press; taken off where that is allowed. */
@Component({
  selector: 'us-photos',
  imports: [Photo],
  template: `
    @if (photos().length > 0) {
      <ul>
        @for (photo of photos(); track photo.id) {
          <li>
            <button
              type="button"
              class="picture"
              [attr.aria-label]="'Show large: ' + photo.alt"
              (click)="enlarge(photo)"
            >
              <us-photo [photo]="photo" />
            </button>
            @if (photo.state) {
              <span class="state">{{ photo.state }}</span>
            }
            @if (photo.removable) {
              <button
                type="button"
                class="us-action us-unprinted"
                [attr.aria-label]="'Remove ' + photo.alt"
                (click)="removed.emit(photo.id)"
              >
                Remove
              </button>
            }
          </li>
        }
      </ul>
    }
  `,
  styles: `
    ul {
      display: flex;
      flex-wrap: wrap;
      gap: 8px;
      list-style: none;
    }
    li {
      display: flex;
      flex-direction: column;
      width: 88px;
    }
    .picture {
      padding: 0;
      border: 0;
      border-radius: var(--us-radius);
      background: none;
      cursor: pointer;
    }
    .state {
      color: var(--us-quiet);
      font-size: 14px;
      line-height: 18px;
    }
    .us-action {
      min-height: 44px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Photos {
  readonly photos = input.required<readonly ShownPhoto[]>();
  /** Id of the one to take off. */
  readonly removed = output<string>();
  private readonly dialog = inject(MatDialog);

  protected enlarge(photo: ShownPhoto): void {
    this.dialog.open(PhotoDialog, { data: photo, maxWidth: '96vw', autoFocus: 'dialog' });
  }
}

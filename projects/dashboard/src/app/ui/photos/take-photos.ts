import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

/** Takes a photo with the camera of a phone, or chooses some from the device. */
@Component({
  selector: 'us-take-photos',
  template: `
    <label>
      Take a photo
      <input
        #camera
        class="us-unseen"
        type="file"
        accept="image/jpeg,image/png"
        capture="environment"
        [attr.aria-label]="'Take a photo of ' + of()"
        (change)="give(camera)"
      />
    </label>
    <label>
      Choose photos
      <input
        #gallery
        class="us-unseen"
        type="file"
        accept="image/jpeg,image/png"
        multiple
        [attr.aria-label]="'Choose photos of ' + of()"
        (change)="give(gallery)"
      />
    </label>
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(0, 1fr) minmax(0, 1fr);
      gap: 8px;
    }
    label {
      position: relative;
      display: flex;
      align-items: center;
      justify-content: center;
      min-height: 46px;
      padding: 4px 8px;
      border: 1px solid var(--us-ink);
      border-radius: var(--us-radius);
      background: var(--us-sheet);
      font: 500 14px/18px var(--us-font);
      cursor: pointer;
    }
    label:hover {
      background: var(--us-pointer);
    }
    label:focus-within {
      outline: 2px solid var(--us-ink);
      outline-offset: 2px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TakePhotos {
  /** What they show: "sill, inner, left", or the car. */
  readonly of = input.required<string>();
  readonly taken = output<readonly File[]>();

  protected give(box: HTMLInputElement): void {
    const files = [...(box.files ?? [])];
    // The same photo may be chosen again after it was removed.
    box.value = '';
    if (files.length > 0) this.taken.emit(files);
  }
}

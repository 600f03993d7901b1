import { ChangeDetectionStrategy, Component, input, linkedSignal, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';

/** Chooses several words of a short list: packages, body types. None means all. */
@Component({
  selector: 'us-kinds-panel',
  imports: [MatButton, MatCheckbox],
  template: `
    <div class="list">
      @for (kind of kinds(); track kind.code) {
        <mat-checkbox
          [checked]="ticked().has(kind.code)"
          (change)="tick(kind.code, $event.checked)"
          >{{ kind.name }}</mat-checkbox
        >
      }
    </div>
    <div class="foot">
      <button matButton="text" type="button" (click)="show.emit([])">{{ all() }}</button>
      <button matButton="filled" type="button" (click)="apply()">Show</button>
    </div>
  `,
  styleUrl: './panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class KindsPanel {
  readonly kinds = input.required<readonly { readonly code: string; readonly name: string }[]>();
  readonly chosen = input.required<readonly string[]>();
  /** Words for all of them: "All packages". */
  readonly all = input.required<string>();
  readonly show = output<string[]>();
  protected readonly ticked = linkedSignal(() => new Set(this.chosen()));

  protected tick(code: string, on: boolean): void {
    const next = new Set(this.ticked());
    if (on) next.add(code);
    else next.delete(code);
    this.ticked.set(next);
  }

  protected apply(): void {
    const ticked = this.ticked();
    const all = this.kinds().every((kind) => ticked.has(kind.code));
    this.show.emit(all ? [] : [...ticked].sort());
  }
}

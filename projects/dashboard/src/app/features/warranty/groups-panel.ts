import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MOST_CURVES } from '#shared/contracts/warranty';

/** A group that can have a curve. */
export interface GroupChoice {
  readonly key: string;
  readonly name: string;
  /** "4,380 cars". */
  readonly cars: string;
}

/** Chooses the groups that have a curve, up to four. Nothing is applied before "Show". */
@Component({
  selector: 'us-groups-panel',
  imports: [MatButton, MatCheckbox],
  template: `
    <div class="list">
      @for (group of groups(); track group.key) {
        <mat-checkbox
          [checked]="ticked().has(group.key)"
          [disabled]="full() && !ticked().has(group.key)"
          (change)="tick(group.key, $event.checked)"
          >{{ group.name }} <span class="us-quiet us-small">{{ group.cars }}</span></mat-checkbox
        >
      }
    </div>
    <div class="foot">
      <span class="us-quiet us-small" role="status">{{
        full() ? 'Four at most: untick one first' : ''
      }}</span>
      <button matButton="filled" type="button" [disabled]="ticked().size === 0" (click)="apply()">
        Show
      </button>
    </div>
  `,
  styleUrl: '../../core/scope-line/panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GroupsPanel {
  readonly groups = input.required<readonly GroupChoice[]>();
  readonly chosen = input.required<readonly string[]>();
  readonly show = output<string[]>();

  protected readonly ticked = linkedSignal(() => new Set(this.chosen()));
  protected readonly full = computed(() => this.ticked().size >= MOST_CURVES);

  protected tick(key: string, on: boolean): void {
    const next = new Set(this.ticked());
    if (on) next.add(key);
    else next.delete(key);
    this.ticked.set(next);
  }

  protected apply(): void {
    this.show.emit([...this.ticked()].sort());
  }
}

import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatMenuModule } from '@angular/material/menu';

/** One thing that the list can be narrowed by. */
export interface FilterChoice {
  readonly value: string;
  readonly words: string;
}

/** A filter as a word that opens its choices: "any cause". */
@Component({
  selector: 'us-filter-menu',
  imports: [MatMenuModule],
  template: `
    <button
      type="button"
      [class.in-force]="chosen()"
      [matMenuTriggerFor]="menu"
      [attr.aria-label]="label() + ': ' + words()"
    >
      {{ words() }}
      <svg viewBox="0 0 10 6" aria-hidden="true"><path d="M1 1l4 4 4-4" /></svg>
    </button>
    <mat-menu #menu="matMenu">
      @for (one of all(); track one.value) {
        <button
          mat-menu-item
          role="menuitemradio"
          [attr.aria-checked]="one.value === value()"
          (click)="picked.emit(one.value || null)"
        >
          <span class="us-menu-check" aria-hidden="true">{{
            one.value === value() ? '✓' : ''
          }}</span>{{ one.words }}
        </button>
      }
    </mat-menu>
  `,
  styleUrl: './filter-menu.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FilterMenu {
  /** What it filters by: "Cause". */
  readonly label = input.required<string>();
  /** Said while nothing is chosen: "any cause". */
  readonly any = input.required<string>();
  readonly choices = input.required<readonly FilterChoice[]>();
  /** Empty: nothing is chosen. */
  readonly value = input.required<string>();
  readonly picked = output<string | null>();

  protected readonly all = computed(() => [{ value: '', words: this.any() }, ...this.choices()]);
  protected readonly chosen = computed(() =>
    this.choices().find(({ value }) => value === this.value()),
  );
  protected readonly words = computed(() => this.chosen()?.words ?? this.any());
}

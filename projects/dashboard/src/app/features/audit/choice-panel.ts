import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';

/** Something to choose in a panel. */
export interface Choice {
  readonly value: string;
  readonly words: string;
}

/** Above so many choices a search field stands over the list. */
const SEARCH_FROM = 9;

/** Chooses one of a list, or none of it. */
@Component({
  selector: 'us-choice-panel',
  template: `
    @if (choices().length >= least) {
      <div class="search">
        <input
          type="search"
          autocomplete="off"
          [placeholder]="find()"
          [attr.aria-label]="find()"
          [value]="search()"
          (input)="search.set($any($event.target).value)"
        />
      </div>
    }
    <div class="list">
      <button
        type="button"
        class="choice"
        [attr.aria-pressed]="!chosen()"
        (click)="show.emit(undefined)"
      >
        <span class="tick" aria-hidden="true">{{ chosen() ? '' : '✓' }}</span> {{ all() }}
      </button>
      @for (choice of listed(); track choice.value) {
        <button
          type="button"
          class="choice"
          [attr.aria-pressed]="chosen() === choice.value"
          (click)="show.emit(choice.value)"
        >
          <span class="tick" aria-hidden="true">{{ chosen() === choice.value ? '✓' : '' }}</span>
          {{ choice.words }}
        </button>
      }
    </div>
  `,
  styleUrl: '../../core/scope-line/panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChoicePanel {
  readonly choices = input.required<readonly Choice[]>();
  readonly chosen = input<string>();
  /** Words for no choice: "Everybody". */
  readonly all = input.required<string>();
  /** What the search field asks for: "Find a branch". */
  readonly find = input.required<string>();
  readonly show = output<string | undefined>();

  protected readonly least = SEARCH_FROM;
  protected readonly search = signal('');
  protected readonly listed = computed(() => {
    const wanted = this.search().trim().toLocaleLowerCase();
    return this.choices().filter(({ words }) => words.toLocaleLowerCase().includes(wanted));
  });
}

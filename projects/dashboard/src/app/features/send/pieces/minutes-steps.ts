import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { formatMinutes } from '../../../ui/format';
import { addMinutes } from '../timers';
import { OpenDraft } from '../open-draft';

/** Minutes between a minus and a plus, for a thumb in a glove: "− repair 2 h +". */
@Component({
  selector: 'us-minutes-steps',
  template: `
    <div role="group" [attr.aria-label]="label()">
      <button
        type="button"
        [attr.aria-label]="label() + ': ' + words(by()) + ' less'"
        [attr.aria-disabled]="minutes() === 0"
        (click)="step(-by())"
      >
        −
      </button>
      <output aria-live="polite">{{ label() }} {{ words(minutes()) }}</output>
      <button
        type="button"
        [attr.aria-label]="label() + ': ' + words(by()) + ' more'"
        [attr.data-path]="path()"
        (click)="step(by())"
      >
        +
      </button>
    </div>
  `,
  styleUrl: './minutes-steps.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MinutesSteps {
  readonly path = input.required<string>();
  readonly label = input.required<string>();
  /** Minutes a press. */
  readonly by = input(15);

  private readonly draft = inject(OpenDraft);
  protected readonly words = formatMinutes;
  protected readonly minutes = computed(
    () => (this.draft.valueAt(this.path()) as number | undefined) ?? 0,
  );

  protected step(minutes: number): void {
    if (minutes < 0 && this.minutes() === 0) return;
    this.draft.rewrite((document) => addMinutes(document, this.path(), minutes));
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { Signal } from '#shared/contracts/signals';
import { DangerSign } from '../../ui/danger-sign/danger-sign';
import { KeptText } from '../../ui/kept-text';
import { AcknowledgeForm, nameOf } from './acknowledge-form';
import { SignalCars } from './signal-cars';
import type { SignalRow } from './signal-words';

/** One signal in the list: what, since when, how strong, where it stands; opens to its cars and to the form to note that it was seen. */
@Component({
  selector: 'us-signal-item',
  imports: [AcknowledgeForm, DangerSign, RouterLink, SignalCars],
  templateUrl: './signal-item.html',
  styleUrl: './signal-item.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignalItem {
  readonly row = input.required<SignalRow>();
  /** Whether the reader may agree actions. */
  readonly mayAgree = input.required<boolean>();
  readonly acknowledged = output<Signal>();

  private readonly kept = inject(KeptText);
  protected readonly carsOpen = linkedSignal({
    source: () => this.row().key,
    computation: () => false,
  });
  protected readonly formOpen = linkedSignal({
    source: () => this.row().key,
    computation: () => false,
  });
  protected readonly over = computed(() => this.row().of.state === 'over');
  protected readonly formWord = computed(() => {
    const { of } = this.row();
    if (this.formOpen()) return 'Close the note';
    if (this.kept.read(nameOf(of)) !== undefined) return 'Go on with the note';
    return of.acknowledged ? 'Change the note' : 'Note that it was seen';
  });

  protected done(of: Signal): void {
    this.formOpen.set(false);
    this.acknowledged.emit(of);
  }
}

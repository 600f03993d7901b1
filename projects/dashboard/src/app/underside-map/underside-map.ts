import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { UndersideArea } from './underside-input';

/** The car seen from below, its zones shaded by the share of cars with rot, with the same figures as a table one press away. */
@Component({
  selector: 'us-underside-map',
  template: '',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndersideMap {
  readonly areas = input.required<readonly UndersideArea[]>();
  /** Names the thing and its unit. */
  readonly heading = input.required<string>();
  /** The picture's finding as a sentence. */
  readonly finding = input.required<string>();
  /** The quiet line below the heading: the method in one breath. */
  readonly note = input('');
  /** Anchor of the definition on "How it is counted". */
  readonly definition = input<string>();
  /** The place that was picked by pointer or with Enter. */
  readonly chosen = output<UndersideArea>();
}

import { NgTemplateOutlet } from '@angular/common';
import {
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { Hatch } from '../charts/pieces/hatch';
import * as lines from './geometry/car-lines';
import { CAR, type Point } from './geometry/outline';
import { shapesOf, USUAL_PLACES } from './geometry/place-shapes';
import type { Look } from './share-scale';

/** A place drawn on the car. */
export interface DrawnPlace {
  readonly key: string;
  /** As it is heard. */
  readonly name: string;
  readonly look: Look;
  readonly shapes: readonly string[];
}

/** A touch or click on the drawing, in its own units, and the place it met. */
export interface Touch {
  readonly point: Point;
  readonly key: string | undefined;
  /** What touched it. */
  readonly pointer: 'mouse' | 'other';
}

const BLANKS = USUAL_PLACES.flatMap(({ zone, side }) => shapesOf(zone, side));

/**
 * The drawing itself: a car seen from below and places on it. Places are a plain picture, a list to read with the arrow keys, or
 * radio buttons; whoever uses it lays words over it.
 */
@Component({
  selector: 'us-underside-car',
  imports: [Hatch, NgTemplateOutlet],
  templateUrl: './underside-car.html',
  styleUrl: './underside-car.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { '(click)': 'touch($event)' },
})
export class UndersideCar {
  readonly places = input.required<readonly DrawnPlace[]>();
  /** Width in CSS px; the height follows. */
  readonly width = input.required<number>();
  /** `plain` drops ribs, holes and arms; `small` all but outline, tyres and zones. */
  readonly detail = input<'full' | 'plain' | 'small'>('full');
  readonly kind = input<'picture' | 'listbox' | 'radiogroup'>('picture');
  /** Names the list or the group of radio buttons. */
  readonly label = input('');
  /** Key of the place that is picked. */
  readonly picked = input<string | null>(null);
  /** The place under pointer or keyboard. */
  readonly pointed = output<string | null>();
  /** The place picked with Enter or Space. */
  readonly pressed = output<string>();
  readonly touched = output<Touch>();

  protected readonly car = CAR;
  protected readonly lines = lines;
  protected readonly blanks = BLANKS;
  /** Hatching keeps its size on screen whatever the size of the car; the small car's is finer. */
  protected readonly hatching = computed(() => {
    const pixel = CAR.width / this.width();
    return this.detail() === 'small'
      ? { pitch: 4 * pixel, line: pixel }
      : { pitch: 7 * pixel, line: 2.4 * pixel };
  });
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  private readonly last = signal<string | null>(null);
  private readonly ringKey = signal<string | null>(null);
  /** The place with the ring of the keyboard, drawn over its neighbours. */
  protected readonly ringed = computed(() =>
    this.places().find(({ key }) => key === this.ringKey()),
  );
  /** The one place that Tab stops at. */
  protected readonly stop = computed(() => {
    const keys = this.places().map(({ key }) => key);
    return [this.last(), this.picked()].find((key) => key && keys.includes(key)) ?? keys[0];
  });

  protected enter(key: string, event: FocusEvent): void {
    this.last.set(key);
    this.ringKey.set((event.target as Element).matches(':focus-visible') ? key : null);
    this.pointed.emit(key);
  }

  protected leave(): void {
    this.ringKey.set(null);
    this.pointed.emit(null);
  }

  protected touch(event: MouseEvent): void {
    const key = (event.target as Element).closest('[data-key]')?.getAttribute('data-key');
    // A screen reader's click has no place of its own.
    if (event.detail === 0 && key) {
      this.pressed.emit(key);
      return;
    }
    const frame = this.host.querySelector('svg')!.getBoundingClientRect();
    const x = ((event.clientX - frame.left) / frame.width) * CAR.width;
    const y = ((event.clientY - frame.top) / frame.height) * CAR.height;
    this.touched.emit({ point: [x, y], key: key ?? undefined, pointer: pointerOf(event) });
  }

  protected press(event: KeyboardEvent): void {
    const keys = this.places().map(({ key }) => key);
    const now = keys.indexOf(this.stop() ?? '');
    if (event.key === 'Enter' || event.key === ' ') {
      event.preventDefault();
      if (now >= 0) this.pressed.emit(keys[now]!);
      return;
    }
    if (event.key === 'Escape') {
      this.pointed.emit(null);
      return;
    }
    const next = afterKey(event.key, now, keys.length - 1);
    if (next === undefined) return;
    event.preventDefault();
    this.host.querySelector<SVGElement>(`[data-key="${keys[next]}"]`)?.focus();
  }
}

/** A click says what made it where the browser knows; a finger is assumed where it does not. */
function pointerOf(event: MouseEvent): Touch['pointer'] {
  return 'pointerType' in event && event.pointerType === 'mouse' ? 'mouse' : 'other';
}

function afterKey(key: string, now: number, last: number): number | undefined {
  switch (key) {
    case 'ArrowRight':
    case 'ArrowDown':
      return now >= last ? 0 : now + 1;
    case 'ArrowLeft':
    case 'ArrowUp':
      return now <= 0 ? last : now - 1;
    case 'Home':
      return 0;
    case 'End':
      return last;
    default:
      return undefined;
  }
}

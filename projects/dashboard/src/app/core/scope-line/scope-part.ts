import { A11yModule } from '@angular/cdk/a11y';
import { type ConnectedPosition, OverlayModule } from '@angular/cdk/overlay';
import {
  ChangeDetectionStrategy,
  Component,
  contentChild,
  input,
  signal,
  TemplateRef,
} from '@angular/core';
import { NgTemplateOutlet } from '@angular/common';

const BELOW: ConnectedPosition[] = [
  { originX: 'start', originY: 'bottom', overlayX: 'start', overlayY: 'top', offsetY: 6 },
  { originX: 'end', originY: 'bottom', overlayX: 'end', overlayY: 'top', offsetY: 6 },
  { originX: 'start', originY: 'top', overlayX: 'start', overlayY: 'bottom', offsetY: -6 },
];

/** One part of the scope line: words that are a control, and the panel it opens. The panel's content is a template, made when it opens. */
@Component({
  selector: 'us-scope-part',
  imports: [A11yModule, NgTemplateOutlet, OverlayModule],
  templateUrl: './scope-part.html',
  styleUrl: './scope-part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScopePart {
  /** What the part is about: "Branches". */
  readonly label = input.required<string>();
  /** What it says now: "Havnsund". */
  readonly words = input.required<string>();
  protected readonly panel = contentChild.required(TemplateRef);
  protected readonly isOpen = signal(false);
  protected readonly positions = BELOW;

  open(): void {
    this.isOpen.set(true);
  }

  close(): void {
    this.isOpen.set(false);
  }
}

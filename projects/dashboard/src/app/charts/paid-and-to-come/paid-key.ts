import { ChangeDetectionStrategy, Component } from '@angular/core';
import { Hatch } from '../pieces/hatch';

/** What the two parts of a bar stand for, as words after the line that explains them. */
@Component({
  selector: 'us-paid-key',
  imports: [Hatch],
  template: `
    <span
      ><svg width="22" height="12" aria-hidden="true">
        <rect class="paid" width="22" height="12" /></svg
      >paid</span
    >
    <span
      ><svg width="22" height="12" aria-hidden="true">
        <defs><pattern us-hatch #hatch="usHatch" [pitch]="6" [line]="2" /></defs>
        <rect class="to-come" x=".5" y=".5" width="21" height="11" [attr.fill]="hatch.fill" /></svg
      >still to come, with its 95 % interval</span
    >
  `,
  styleUrl: './paid-key.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PaidKey {}

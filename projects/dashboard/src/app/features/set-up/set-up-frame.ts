import { ChangeDetectionStrategy, Component } from '@angular/core';
import { RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { PARTS } from './parts';

/** Set-up: its parts in a quiet list, the open one beside it. */
@Component({
  selector: 'us-set-up-frame',
  imports: [RouterLink, RouterLinkActive, RouterOutlet],
  templateUrl: './set-up-frame.html',
  styleUrl: './set-up-frame.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetUpFrame {
  protected readonly parts = PARTS;
}

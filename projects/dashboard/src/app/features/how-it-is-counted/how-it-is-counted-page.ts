import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ActivatedRoute, RouterLink } from '@angular/router';
import { DEFINITION_GROUPS } from './definitions';

/** Every figure of the product: what it means, how it is computed, what is left out, where the method comes from. */
@Component({
  selector: 'us-how-it-is-counted-page',
  imports: [RouterLink],
  templateUrl: './how-it-is-counted-page.html',
  styleUrl: './how-it-is-counted-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HowItIsCountedPage {
  protected readonly groups = DEFINITION_GROUPS;
  /** The definition that was linked to. */
  protected readonly asked = toSignal(inject(ActivatedRoute).fragment);
}

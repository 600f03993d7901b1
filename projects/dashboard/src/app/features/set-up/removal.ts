import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { removePackage, removeProduct } from '#shared/contracts/set-up-help';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Trouble } from '../../ui/trouble/trouble';

/** Takes a product or a package out that nothing refers to; says what does where something does. */
@Component({
  selector: 'us-removal',
  imports: [MatButton, Trouble],
  template: `
    <h2>Take it out</h2>
    <p class="us-small us-quiet">{{ onlyIf() }}</p>
    <div role="alert">
      @if (removing.problem(); as problem) {
        <us-trouble>{{ problem.sentence }}</us-trouble>
      }
    </div>
    <button matButton="outlined" type="button" [disabled]="removing.busy()" (click)="remove()">
      Take {{ name() }} out
    </button>
  `,
  styles: `
    button {
      margin-top: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Removal {
  readonly kind = input.required<'product' | 'package'>();
  readonly code = input.required<string>();
  readonly name = input.required<string>();
  /** When it can be. */
  readonly onlyIf = input.required<string>();
  readonly removed = output();

  private readonly api = inject(Api);
  protected readonly removing = deed((params: { code: string }) =>
    this.kind() === 'product'
      ? this.api.call(removeProduct, { params })
      : this.api.call(removePackage, { params }),
  );

  protected async remove(): Promise<void> {
    if (await this.removing.run({ code: this.code() })) this.removed.emit();
  }
}

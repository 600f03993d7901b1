import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { localDate } from '#shared/domain/calendar';
import { Catalogue } from '../../../core/catalogue/catalogue';
import { currencySign } from '../../../ui/format';
import { withValue } from '../draft-document';
import { OpenDraft } from '../open-draft';
import { SendField } from './send-field';

/** What the owner agreed to beyond the quote, taken down on the day it is agreed (rule 76). */
@Component({
  selector: 'us-agreed-extras',
  imports: [MatButton, SendField],
  template: `
    <p class="us-small us-quiet">
      Take it down when the owner says yes: what is agreed by word of mouth is forgotten on the
      bill.
    </p>
    @for (extra of extras(); track extra.path) {
      <fieldset>
        <legend class="us-unseen">Agreed beyond the quote, {{ $index + 1 }}</legend>
        <div class="two">
          <us-send-field [path]="extra.path + '/on'" label="Agreed on" kind="date" />
          <us-send-field [path]="extra.path + '/minutes'" label="Minutes" kind="minutes" />
        </div>
        @if (draft.money() === 'shown') {
          <us-send-field
            [path]="extra.path + '/priceCents'"
            [label]="'Price before tax, ' + sign()"
            kind="amount"
          />
        }
        <us-send-field [path]="extra.path + '/note'" label="What was agreed" [most]="4000" />
        <button
          type="button"
          class="us-action"
          [attr.aria-label]="'Take it off: what was agreed, ' + ($index + 1)"
          (click)="remove($index)"
        >
          Take it off
        </button>
      </fieldset>
    }
    <button matButton="outlined" type="button" (click)="add()">
      {{ extras().length === 0 ? 'The owner agreed to more' : 'Agreed to yet more' }}
    </button>
  `,
  styles: `
    :host,
    fieldset {
      display: flex;
      flex-direction: column;
      gap: 8px;
    }
    fieldset {
      padding-bottom: 8px;
      border-bottom: 1px solid var(--us-hairline);
    }
    .two {
      display: grid;
      grid-template-columns: minmax(0, 1fr) minmax(0, 1fr);
      gap: 8px;
    }
    button {
      min-height: 44px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class AgreedExtras {
  protected readonly draft = inject(OpenDraft);
  private readonly catalogue = inject(Catalogue);
  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  protected readonly extras = computed(() =>
    (this.draft.document().agreedExtras ?? []).map((_, index) => ({
      path: `/agreedExtras/${index}`,
    })),
  );

  protected add(): void {
    const zone = new Intl.DateTimeFormat().resolvedOptions().timeZone;
    const on = this.catalogue.today() ?? localDate(new Date(this.draft.now()), zone);
    this.draft.rewrite((document) =>
      withValue(document, '/agreedExtras', [...(document.agreedExtras ?? []), { on, minutes: 0 }]),
    );
  }

  protected remove(index: number): void {
    this.draft.set(`/agreedExtras/${index}`, undefined);
  }
}

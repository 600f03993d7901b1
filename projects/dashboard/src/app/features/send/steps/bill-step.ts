import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  linkedSignal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { Catalogue } from '../../../core/catalogue/catalogue';
import { currencySign, formatExactMoney } from '../../../ui/format';
import { agreedTotal } from '../agreed-total';
import { withValue } from '../draft-document';
import { OpenDraft } from '../open-draft';
import { NotesField } from '../pieces/notes-field';
import { PhotosHere } from '../pieces/photos-here';
import { SendField } from '../pieces/send-field';

/** Sixth step: the bill, or later; and what else is to be said. Recorders write no bill (rule 24). */
@Component({
  selector: 'us-bill-step',
  imports: [MatButton, NotesField, PhotosHere, SendField],
  template: `
    @if (draft.money() === 'shown') {
      <h2>Bill</h2>
      @if (stays()) {
        <p class="quiet">The bill on record stays unless it is changed here.</p>
      } @else {
        <div class="two choice" role="group" aria-label="The bill">
          <button
            type="button"
            [class.taken]="now()"
            [attr.aria-pressed]="now()"
            (click)="billNow()"
          >
            Bill it now
          </button>
          <button
            type="button"
            [class.taken]="!now()"
            [attr.aria-pressed]="!now()"
            (click)="billLater()"
          >
            Bill it later
          </button>
        </div>
      }
      @if (now()) {
        <us-send-field
          path="/invoice/totalCents"
          [label]="'Bill before tax, ' + sign()"
          kind="amount"
        />
        @if (agreed(); as agreed) {
          <button matButton="outlined" type="button" (click)="takeAgreed()">
            {{ agreed.words }}
          </button>
        }
        <us-send-field path="/invoice/number" label="Number of the bill" [most]="64" />
        <us-send-field path="/invoice/issuedOn" label="Billed on" kind="date" />
      } @else {
        <p class="quiet">The car waits on This week until its bill is written.</p>
      }
      <us-send-field
        path="/boughtInCents"
        [label]="'Bought in for this car, ' + sign()"
        kind="amount"
        note="Parts and work of others."
      />
    } @else {
      <p class="quiet">The bill is written in the office.</p>
    }
    <h2>Notes</h2>
    <us-notes-field />
    <h2>The car as a whole</h2>
    <us-photos-here [finding]="null" />
  `,
  styleUrls: ['./step.scss', './bill-step.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BillStep {
  protected readonly draft = inject(OpenDraft);
  private readonly catalogue = inject(Catalogue);
  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  /** Whether the bill is written here; taken back when its last field is emptied and the page is left. */
  protected readonly now = linkedSignal<string | undefined, boolean>({
    source: () => this.draft.id(),
    computation: () => untracked(() => this.draft.document().invoice !== undefined),
  });
  /** A bill on record is corrected here, not taken back: without one sent, the stored one stays (rule 73). */
  protected readonly stays = linkedSignal<string | undefined, boolean>({
    source: () => this.draft.id(),
    computation: () =>
      untracked(
        () =>
          this.draft.kept()?.corrects !== undefined && this.draft.document().invoice !== undefined,
      ),
  });
  protected readonly agreed = computed(() => {
    const { invoice } = this.draft.document();
    const total = agreedTotal(this.draft.document());
    if (total === undefined || invoice?.totalCents !== undefined) return undefined;
    return {
      total,
      words: `${formatExactMoney(total, this.catalogue.currency())}, quoted and agreed`,
    };
  });

  protected billNow(): void {
    this.now.set(true);
    const on = this.catalogue.today();
    if (on && !this.draft.document().invoice) this.draft.set('/invoice/issuedOn', on);
  }

  protected billLater(): void {
    this.now.set(false);
    this.draft.rewrite((document) => withValue(document, '/invoice', undefined));
  }

  protected takeAgreed(): void {
    const agreed = this.agreed();
    if (agreed) this.draft.set('/invoice/totalCents', agreed.total);
  }
}

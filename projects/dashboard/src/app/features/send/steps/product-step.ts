import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { CHECK_ANSWERS, CHECKS, CONSUMABLE_KINDS } from '#shared/domain/vocabulary';
import { Catalogue } from '../../../core/catalogue/catalogue';
import { Caution } from '../../../ui/caution/caution';
import { formatVolume } from '../../../ui/format';
import { CHECK_ANSWER_NAMES, CHECK_NAMES, CONSUMABLE_NAMES } from '../../../ui/words';
import { withValue } from '../draft-document';
import { OpenDraft } from '../open-draft';
import { type Choice, ChoiceRow } from '../pieces/choice-row';
import { SendField } from '../pieces/send-field';
import { productRows, type ProductRow } from '../product-rows';
import { productCautions } from '../send-cautions';
import { addMinutes as addTo } from '../timers';

const SHORT_ANSWERS = { yes: 'yes', no: 'no', na: 'n.a.' } as const;

/** Fifth step: product, clips and other consumables, the six checks, the workshop's weather. */
@Component({
  selector: 'us-product-step',
  imports: [Caution, ChoiceRow, MatButton, SendField],
  templateUrl: './product-step.html',
  styleUrls: ['./step.scss', './product-step.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ProductStep {
  protected readonly draft = inject(OpenDraft);
  private readonly catalogue = inject(Catalogue);
  protected readonly formatVolume = formatVolume;
  protected readonly cautions = productCautions();
  protected readonly rows = computed(() =>
    productRows(this.draft.document(), this.draft.norms(), this.draft.usual()?.lastTime).map(
      (row) => ({ ...row, name: this.catalogue.productName(row.product) }),
    ),
  );
  /** Everything of last time at one press, while none of it is written down. */
  protected readonly offers = computed(() =>
    this.rows().flatMap(({ product, offer }) => (offer ? [{ product, ml: offer.ml }] : [])),
  );
  protected readonly isBlank = computed(() => this.draft.document().products === undefined);
  protected readonly others = computed(() => {
    const shown = new Set(this.rows().map(({ product }) => product));
    return (this.catalogue.value()?.products ?? []).filter(({ code }) => !shown.has(code));
  });
  protected readonly kinds = CONSUMABLE_KINDS.map((kind) => ({
    kind,
    path: `/consumables/${kind}/quantity`,
    name: CONSUMABLE_NAMES[kind],
  }));
  protected readonly checks = CHECKS.map((check) => ({
    path: `/checks/${check}`,
    words: CHECK_NAMES[check],
  }));
  protected readonly answers: readonly Choice[] = CHECK_ANSWERS.map((value) => ({
    value,
    words: SHORT_ANSWERS[value],
    // What is seen comes first, for those who say it to a machine.
    name:
      SHORT_ANSWERS[value] === CHECK_ANSWER_NAMES[value]
        ? SHORT_ANSWERS[value]
        : `${SHORT_ANSWERS[value]}, ${CHECK_ANSWER_NAMES[value]}`,
  }));

  protected take({ path, offer }: ProductRow): void {
    if (offer) this.draft.set(path, offer.ml);
  }

  protected takeAll(): void {
    const offers = this.offers();
    this.draft.rewrite((document) => withValue(document, '/products', offers));
  }

  protected add(path: string, amount: number): void {
    this.draft.rewrite((document) => addTo(document, path, amount));
  }

  protected addProduct(box: HTMLSelectElement): void {
    if (box.value) this.draft.set(`/products/${box.value}/ml`, 0);
    box.value = '';
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
} from '@angular/core';
import { Router } from '@angular/router';
import { exportQuote } from '#shared/contracts/exports';
import { listJobs } from '#shared/contracts/job-list';
import { getQuote } from '#shared/contracts/quote';
import { BarWhiskerChart } from '../../charts/bar-whisker/bar-whisker-chart';
import { DotIntervalChart } from '../../charts/dot-interval/dot-interval-chart';
import { ValueCurveChart } from '../../charts/value-curve/value-curve-chart';
import { Api } from '../../core/api/api';
import { CsvLink } from '../../core/api/csv-link';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { DefinitionLink } from '../../ui/definition-link/definition-link';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { currencySign, formatMonth, formatVolume } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { Trouble } from '../../ui/trouble/trouble';
import { BODY_TYPE_NAMES } from '../../ui/words';
import { chancePicture } from './chance-picture';
import { knownCars, usualPackage } from '../../core/catalogue/known-cars';
import { labourPicture } from './labour-picture';
import { noPriceWords } from './no-price';
import { priceLines, pricePicture } from './price-picture';
import { QuoteForm } from './quote-form';
import { type AskedParts, type QuoteQuestion, questionOf } from './quote-question';
import { refusalWords } from './refusal-words';
import { quoteSentences } from './quote-sentences';

/** Jobs looked through for makes and models to offer. */
const LOOKED_THROUGH = 200;

/** What the next car is likely to take and cost, from the nearest set of cars. The question is the URL. */
@Component({
  selector: 'us-quote-page',
  imports: [
    Answer,
    BarWhiskerChart,
    CsvLink,
    DefinitionLink,
    DotIntervalChart,
    EmptyNext,
    LoadState,
    QuoteForm,
    TableTwin,
    Trouble,
    ValueCurveChart,
  ],
  templateUrl: './quote-page.html',
  styleUrl: './quote-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuotePage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);
  private readonly window = inject(DOCUMENT).defaultView;
  private readonly role = inject(Session).role;
  protected readonly export = exportQuote;

  // From the URL.
  readonly make = input<string>();
  readonly model = input<string>();
  readonly firstRegistered = input<string>();
  readonly bodyType = input<string>();
  readonly package = input<string>();
  readonly branch = input<string>();
  readonly marginShare = input<string>();

  protected readonly money = computed(() => (this.role() === 'recorder' ? 'hidden' : 'shown'));
  protected readonly asked = computed<AskedParts>(() => ({
    make: this.make(),
    model: this.model(),
    firstRegistered: this.firstRegistered(),
    bodyType: this.bodyType(),
    package: this.package(),
    branch: this.branch(),
    marginShare: this.money() === 'shown' ? this.marginShare() : undefined,
  }));
  protected readonly question = computed(() => questionOf(this.asked()));
  protected readonly exportQuery = computed(() => {
    const question = this.question();
    return question && { ...question };
  });
  protected readonly quote = this.api.read(getQuote, () => {
    const question = this.question();
    return question && { query: question };
  });
  private readonly lately = this.api.read(listJobs, () => ({ query: { limit: LOOKED_THROUGH } }));
  protected readonly known = computed(() => knownCars(this.lately.value()?.items ?? []));

  protected readonly usual = computed(() => usualPackage(this.lately.value()?.items ?? []));
  /** A question that cannot be answered as it is: which part of it, and why. */
  protected readonly refused = computed(() => {
    const problem = this.quote.problem();
    return problem?.status === 422 ? refusalWords(problem.fields) : undefined;
  });

  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  protected readonly view = computed(() => {
    const answer = this.quote.value();
    const question = this.question();
    if (!answer || !question) return undefined;
    const currency = this.catalogue.currency();
    return {
      answer: quoteSentences(answer, question, currency),
      any: answer.basis.kind !== 'none',
      labour: labourPicture(answer),
      chances: chancePicture(answer),
      price: pricePicture(answer, currency),
      lines: priceLines(answer),
      noPrice: noPriceWords(answer, {
        branchName: (code) => this.catalogue.branchName(code),
        productName: (code) => this.catalogue.productName(code),
      }),
      products: answer.products.map(({ product, ml }) => ({
        name: this.catalogue.productName(product),
        text: formatVolume(ml),
      })),
    };
  });
  /** The question in words, for the printed page, where the form is not. */
  protected readonly words = computed(() => {
    const question = this.question();
    if (!question) return '';
    return [
      `${question.make} ${question.model}`,
      `${BODY_TYPE_NAMES[question.bodyType]}, first registered ${formatMonth(question.firstRegistered)}`,
      `package ${this.catalogue.packageName(question.package)}`,
      this.catalogue.branchName(question.branch),
    ].join(' · ');
  });

  protected ask(question: QuoteQuestion): void {
    void this.router.navigate([], {
      queryParams: { ...question, marginShare: question.marginShare ?? null },
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }

  protected print(): void {
    this.window?.print();
  }
}

import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { STAGES } from '#shared/domain/vocabulary';
import { Catalogue } from '../../../core/catalogue/catalogue';
import { currencySign, formatDate, formatExactMoney, formatMinutes } from '../../../ui/format';
import { STAGE_NAMES } from '../../../ui/words';
import { OpenDraft } from '../open-draft';
import { ChoiceList } from '../pieces/choice-list';
import { SendField } from '../pieces/send-field';
import { withValue } from '../draft-document';

/** Second step: what was sold, when, and for what estimate. */
@Component({
  selector: 'us-package-step',
  imports: [ChoiceList, MatButton, SendField],
  template: `
    <us-choice-list path="/package" label="Package" [choices]="packages()" />
    <us-send-field path="/bookedOn" label="Booked on" kind="date" />
    <us-send-field path="/startedOn" label="Started on" kind="date" />
    <us-send-field path="/completedOn" label="Finished on" kind="date" />
    @if (draft.document().completedOn === undefined && today(); as today) {
      <button matButton="outlined" type="button" (click)="draft.set('/completedOn', today)">
        Finished today, {{ formatDate(today) }}
      </button>
    }
    <h2>Estimate</h2>
    <p class="quiet">
      What was agreed before anyone saw the car from below. Leave it empty if there was none.
    </p>
    @if (lastTime(); as last) {
      <button matButton="outlined" type="button" (click)="asLastTime()">
        As last time: {{ last }}
      </button>
    }
    <us-send-field
      path="/estimate/priceCents"
      [label]="'Price quoted before tax, ' + sign()"
      kind="amount"
    />
    <p class="quiet">Minutes estimated, {{ estimated() }} together</p>
    <div class="two">
      @for (stage of stages; track stage.path) {
        <us-send-field [path]="stage.path" [label]="stage.words" kind="minutes" />
      }
    </div>
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PackageStep {
  protected readonly draft = inject(OpenDraft);
  private readonly catalogue = inject(Catalogue);
  protected readonly formatDate = formatDate;
  protected readonly today = this.catalogue.today;
  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  protected readonly packages = computed(() =>
    this.catalogue.packages().map(({ code, name }) => ({ value: code, words: name })),
  );
  protected readonly stages = STAGES.map((stage) => ({
    path: `/estimate/stages/${stage}`,
    words: STAGE_NAMES[stage],
  }));
  protected readonly estimated = computed(() => {
    const stages = this.draft.document().estimate?.stages ?? {};
    return formatMinutes(STAGES.reduce((sum, stage) => sum + (stages[stage] ?? 0), 0));
  });
  private readonly last = computed(() => this.draft.usual()?.lastTime?.estimate ?? undefined);
  /** The newest estimate of this package, offered while none is written down. */
  protected readonly lastTime = computed(() => {
    const last = this.last();
    if (!last || this.draft.document().estimate) return undefined;
    const minutes = STAGES.reduce((sum, stage) => sum + last.stages[stage], 0);
    return `${formatExactMoney(last.priceCents, this.catalogue.currency())}, ${formatMinutes(minutes)}`;
  });

  protected asLastTime(): void {
    const last = this.last();
    if (last) this.draft.rewrite((document) => withValue(document, '/estimate', { ...last }));
  }
}

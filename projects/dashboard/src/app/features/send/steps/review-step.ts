import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Catalogue } from '../../../core/catalogue/catalogue';
import { Caution } from '../../../ui/caution/caution';
import { Trouble } from '../../../ui/trouble/trouble';
import { problemSentence } from '../field-words';
import { OpenDraft } from '../open-draft';
import { BothVersions } from '../pieces/both-versions';
import { refusalSentence } from '../refusal-sentence';
import { reviewWords } from '../review-words';
import { handOverCautions } from '../send-cautions';
import { STEP_NAMES } from '../send-steps';
import { StepWay } from '../step-way';

/** The end: everything in words, what is missing, what is unusual, and the way to each. */
@Component({
  selector: 'us-review-step',
  imports: [BothVersions, Caution, Trouble],
  templateUrl: './review-step.html',
  styleUrls: ['./step.scss', './review-step.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReviewStep {
  protected readonly draft = inject(OpenDraft);
  protected readonly way = inject(StepWay);
  protected readonly sentence = refusalSentence;
  private readonly catalogue = inject(Catalogue);
  private readonly product = (code: string): string => this.catalogue.productName(code);

  protected readonly parts = computed(() =>
    reviewWords(this.draft.document(), {
      packageName: (code) => this.catalogue.packageName(code),
      productName: this.product,
      currency: this.catalogue.currency(),
      money: this.draft.money(),
      now: this.draft.now(),
      photos: this.draft.photos().length,
    }).map((part) => ({ ...part, name: STEP_NAMES[part.step] })),
  );
  protected readonly problems = computed(() =>
    this.draft.problems().map((problem) => ({
      path: problem.path,
      words: problemSentence(this.draft.document(), problem, this.product).replace(/\.\.$/, '.'),
    })),
  );
  protected readonly cautions = computed(() => handOverCautions(this.draft.document()));
  /** Why the server would not take it, where that is not a field. */
  protected readonly refusal = computed(() => {
    const kept = this.draft.kept();
    return kept?.state === 'refused' ? kept.problem : undefined;
  });
}

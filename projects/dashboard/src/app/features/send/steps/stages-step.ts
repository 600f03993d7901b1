import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { STAGES, type Stage } from '#shared/domain/vocabulary';
import { Caution } from '../../../ui/caution/caution';
import { formatMinutes } from '../../../ui/format';
import { Trouble } from '../../../ui/trouble/trouble';
import { STAGE_NAMES } from '../../../ui/words';
import { repairMinutesOf } from '../findings-edit';
import { OpenDraft } from '../open-draft';
import { AgreedExtras } from '../pieces/agreed-extras';
import { SendField } from '../pieces/send-field';
import { stageCautions } from '../send-cautions';
import { SendClock } from '../send-clock';
import { addMinutes, minutesRun, minutesWritten, startTimer, stopTimer } from '../timers';

/** Minutes that one press adds or takes off. */
const PRESSES = [-5, 5, 15, 30] as const;

/** Third step: what each stage took, typed, pressed or timed; and what was agreed beyond the quote. */
@Component({
  selector: 'us-stages-step',
  imports: [AgreedExtras, Caution, SendField, Trouble],
  templateUrl: './stages-step.html',
  styleUrls: ['./step.scss', './stages-step.scss'],
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StagesStep {
  protected readonly draft = inject(OpenDraft);
  private readonly clock = inject(SendClock);
  protected readonly presses = PRESSES;
  protected readonly rows = computed(() => {
    const document = this.draft.document();
    const now = this.draft.now();
    const cautions = stageCautions(document);
    return STAGES.map((stage) => {
      const ran = minutesRun(document, stage, now);
      const estimate = document.estimate?.stages?.[stage];
      return {
        stage,
        name: STAGE_NAMES[stage],
        caution: cautions[stage],
        path: `/actual/stages/${stage}`,
        runs: document.timers?.[stage] !== undefined,
        ran: formatMinutes(ran),
        sum: formatMinutes((minutesWritten(document, stage) ?? 0) + ran),
        estimate: estimate === undefined ? undefined : formatMinutes(estimate),
      };
    });
  });
  protected readonly total = computed(() => {
    const document = this.draft.document();
    const minutes = STAGES.map(
      (stage) =>
        (minutesWritten(document, stage) ?? 0) + minutesRun(document, stage, this.draft.now()),
    );
    return formatMinutes(minutes.reduce((sum, each) => sum + each, 0));
  });
  /** Said here and at the findings at once, whichever was written last (rule 56). */
  protected readonly repair = computed(() => {
    const document = this.draft.document();
    const findings = repairMinutesOf(document);
    const stage =
      (minutesWritten(document, 'repair') ?? 0) + minutesRun(document, 'repair', this.draft.now());
    return findings > stage
      ? `The findings' repair adds to ${formatMinutes(findings)}, this stage has ${formatMinutes(stage)}.`
      : undefined;
  });

  protected add(path: string, minutes: number): void {
    this.draft.rewrite((document) => addMinutes(document, path, minutes));
  }

  protected toggle(stage: Stage): void {
    const now = this.clock.read();
    this.draft.rewrite((document) =>
      document.timers?.[stage] ? stopTimer(document, stage, now) : startTimer(document, stage, now),
    );
  }
}

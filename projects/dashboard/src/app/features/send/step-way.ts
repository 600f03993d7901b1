import { inject, Injectable } from '@angular/core';
import { Router } from '@angular/router';
import { OpenDraft } from './open-draft';
import { type SendStep, stepOfPath } from './send-steps';

/** The way from step to step: the step stands in the address, so that reload and back keep the place. */
@Injectable()
export class StepWay {
  private readonly router = inject(Router);
  private readonly draft = inject(OpenDraft);

  /** Goes to a step. */
  go(step: SendStep): void {
    this.draft.standAt(step);
    void this.router.navigate(['/send', this.draft.id()], { queryParams: { step } });
  }

  /** Goes to the step of a field and puts the focus into it. */
  goToField(path: string): void {
    this.draft.sought.set(path);
    this.go(stepOfPath(path));
  }

  /** Leaves the form once everything is kept. */
  async leave(): Promise<void> {
    await this.draft.flush();
    await this.router.navigate(['/send']);
  }
}

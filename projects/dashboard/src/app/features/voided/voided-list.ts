import { ChangeDetectionStrategy, Component, inject, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { restoreJob } from '#shared/contracts/corrections';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Trouble } from '../../ui/trouble/trouble';
import { type VoidedJob, voidingWords, whatWords } from './voided-words';

/** Voided jobs of one branch, each with the way back. */
@Component({
  selector: 'us-voided-list',
  imports: [MatButton, Trouble],
  template: `
    <ul>
      @for (job of jobs(); track job.jobRef) {
        <li>
          <span class="job">{{ job.jobRef }}</span>
          <span class="words">
            {{ what(job) }}
            <span class="us-quiet">{{ voiding(job) }}</span>
          </span>
          <button
            matButton="outlined"
            type="button"
            [attr.aria-label]="'Bring back job ' + job.jobRef"
            [disabled]="restoring.busy()"
            (click)="bringBack(job)"
          >
            Bring back
          </button>
        </li>
      }
    </ul>
    <div role="alert">
      @if (restoring.problem(); as problem) {
        <us-trouble>{{ problem.sentence }}</us-trouble>
      }
    </div>
  `,
  styleUrl: './voided-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class VoidedList {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  readonly jobs = input.required<readonly VoidedJob[]>();
  readonly restored = output<VoidedJob>();

  protected readonly voiding = voidingWords;
  protected readonly restoring = deed(({ branch, jobRef }: VoidedJob) =>
    this.api.call(restoreJob, { params: { branch, jobRef } }),
  );

  protected what(job: VoidedJob): string {
    return whatWords(job, this.catalogue.packageName(job.package));
  }

  protected async bringBack(job: VoidedJob): Promise<void> {
    if (await this.restoring.run(job)) this.restored.emit(job);
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { getJob } from '#shared/contracts/jobs';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Caution } from '../../ui/caution/caution';
import { DangerSign } from '../../ui/danger-sign/danger-sign';
import { formatDate, formatMonth } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { Mark } from '../../ui/mark/mark';
import { BODY_TYPE_NAMES } from '../../ui/words';
import { UndersideMarks } from '../../underside-map/underside-marks';
import { handedCautions } from './hand-back-cautions';
import { checkFacts, productFacts, warrantyWords } from './hand-back-facts';
import { handedFindings } from './hand-back-findings';

/** More findings than this are set smaller, so that the sheet stays one page. */
const MANY = 16;

/** The sheet that goes home with the car: found, done, left, and what to look out for. One page, no money. */
@Component({
  selector: 'us-hand-back-page',
  imports: [Caution, DangerSign, LoadState, Mark, RouterLink, UndersideMarks],
  templateUrl: './hand-back-page.html',
  styleUrl: './hand-back-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HandBackPage {
  private readonly catalogue = inject(Catalogue);
  private readonly window = inject(DOCUMENT).defaultView;

  // From the path.
  readonly branch = input.required<string>();
  readonly jobRef = input.required<string>();

  protected readonly job = inject(Api).read(getJob, () => ({
    params: { branch: this.branch(), jobRef: this.jobRef() },
  }));
  protected readonly sheet = computed(() => {
    const job = this.job.value();
    if (!job) return undefined;
    const { vehicle } = job;
    const findings = job.findings ?? [];
    return {
      car: `${vehicle.make} ${vehicle.model}`,
      about: [
        `${BODY_TYPE_NAMES[vehicle.bodyType]}, first registered ${formatMonth(vehicle.firstRegistered)}`,
        ...(vehicle.key ? [`car ${vehicle.key}`] : []),
        `job ${job.jobRef}`,
      ].join('; '),
      branch: this.catalogue.branchName(job.branch),
      date: formatDate(job.completedOn),
      package: this.catalogue.packageName(job.package),
      warranty: warrantyWords(job),
      findings: handedFindings(findings),
      many: findings.length > MANY,
      products: productFacts(job, this.catalogue.value()?.products ?? []),
      checks: checkFacts(job),
      cautions: handedCautions(findings),
    };
  });

  protected print(): void {
    this.window?.print();
  }
}

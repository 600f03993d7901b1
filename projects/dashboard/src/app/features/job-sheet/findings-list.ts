import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { ComeBack } from '#shared/contracts/come-back';
import type { JobSheet } from '#shared/contracts/jobs';
import type { Photo } from '#shared/contracts/photos';
import type { PhotographedJob } from '../../core/photos/stored-photos';
import { ConditionSign } from '../../ui/condition-sign/condition-sign';
import { formatExactMoney, formatMinutes } from '../../ui/format';
import { JobPhotos } from '../../ui/photos/job-photos';
import { ACTION_NAMES, CONDITION_NAMES, SIDE_NAMES, ZONE_NAMES } from '../../ui/words';
import { isLeftDangerous } from '#shared/domain/danger';
import { LeftMark } from './left-mark';

/** Rust found on the car, zone by zone: as seen, as worked, what was done. */
@Component({
  selector: 'us-findings-list',
  imports: [ConditionSign, JobPhotos, LeftMark],
  templateUrl: './findings-list.html',
  styleUrl: './findings-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingsList {
  readonly findings = input.required<NonNullable<JobSheet['findings']>>();
  readonly currency = input.required<string>();
  /** How what was left stands since. */
  readonly comeBacks = input<readonly ComeBack[]>([]);
  readonly today = input.required<string>();
  /** Photos of the job, each shown at its finding. */
  readonly photos = input<readonly Photo[]>([]);
  readonly job = input<PhotographedJob>();
  readonly marked = output<ComeBack>();

  protected readonly items = computed(() =>
    this.findings().map((finding, index) => ({
      ...finding,
      number: index + 1,
      photos: this.photos().filter((photo) => photo.finding === finding.ref),
      since: this.comeBacks().find(({ ref }) => ref === finding.ref),
      place: `${ZONE_NAMES[finding.zone]}, ${SIDE_NAMES[finding.side]}`,
      seen: CONDITION_NAMES[finding.seenAs],
      worked: finding.workedAs && CONDITION_NAMES[finding.workedAs],
      done: ACTION_NAMES[finding.action],
      dangerous: isLeftDangerous(finding),
      work: [
        ...(finding.repairMinutes ? [`repair ${formatMinutes(finding.repairMinutes)}`] : []),
        ...(finding.chargedCents
          ? [`charged ${formatExactMoney(finding.chargedCents, this.currency())}`]
          : []),
      ].join(', '),
    })),
  );
}

import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { RouterLink } from '@angular/router';
import { listPeople } from '#shared/contracts/people';
import { getWarrantySchedule, type WarrantySchedule } from '#shared/contracts/warranty-reports';
import { Api } from '../../core/api/api';
import { joinReadings } from '../../core/api/join-readings';
import { formatInstant } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ScheduleForm } from './schedule-form';
import { lastRunSentence, mailStateWords, scheduleSentence } from './schedule-words';

/** When the report is issued and mailed by itself: the choice, what the last run did, and how each of its mails stands. */
@Component({
  selector: 'us-schedule-page',
  imports: [LoadState, RouterLink, ScheduleForm],
  templateUrl: './schedule-page.html',
  styleUrl: './schedule-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SchedulePage {
  private readonly api = inject(Api);
  protected readonly read = joinReadings({
    schedule: this.api.read(getWarrantySchedule, () => ({})),
    people: this.api.read(listPeople, () => ({})),
  });
  protected readonly said = signal('');
  protected readonly view = computed(() => {
    const read = this.read.value();
    if (!read) return undefined;
    const { schedule } = read;
    return {
      schedule,
      people: read.people.items,
      sentence: scheduleSentence(schedule),
      lastRun: lastRunSentence(schedule),
      report: schedule.lastRun?.report,
      mails: schedule.mails.map((mail) => ({
        to: mail.to,
        words: mailStateWords(mail),
        state: mail.state,
      })),
      changed:
        schedule.changedAt !== null && schedule.changedBy !== null
          ? `Set by ${schedule.changedBy}, ${formatInstant(schedule.changedAt)}.`
          : '',
    };
  });

  protected kept(schedule: WarrantySchedule): void {
    this.said.set(`Saved. ${scheduleSentence(schedule)}`);
    this.read.reload();
  }
}

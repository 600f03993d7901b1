import { Cron } from 'croner';
import type { Logger } from 'pino';
import { findRun, insertRun, readSchedule } from '#db/queries/warranty-schedule';
import { HEAD_OFFICE, Scope } from '#db/scope';
import { realClock, todayIn } from '../clock';
import { beginReport, keepReport } from '../features/warranty-reports/issue-report';
import { monthDue, type DueMonth } from '../features/warranty-reports/month-due';
import type { Kit } from '../kit';

const EVERY_HOUR = '0 * * * *';
const SYSTEM = { label: 'system', personId: null, pushKeyId: null, address: 'local' } as const;

type Tools = Pick<Kit, 'store' | 'clock' | 'reads' | 'outbox'>;

/**
 * Issues the warranty report by itself, once a month from the chosen day on, and has it mailed. It looks at every start and
 * every hour, so that a month is caught up with after the server was down. Months that went by altogether are not made up:
 * their report can be issued as of any past day.
 */
export class ReportSchedule {
  private job: Cron | undefined;
  private running: Promise<void> | undefined;

  constructor(
    private readonly kit: Tools,
    private readonly log: Logger,
  ) {}

  /** Begins to look. */
  start(): void {
    this.job ??= new Cron(EVERY_HOUR, { unref: true }, () => void this.check());
    void this.check();
  }

  /** Issues what is due and not done; what fails is tried again within the hour. */
  check(): Promise<void> {
    this.running ??= this.issueDue()
      .catch((error: unknown) => {
        this.log.error({ err: error }, 'the warranty report of the month could not be issued');
      })
      .finally(() => {
        this.running = undefined;
      });
    return this.running;
  }

  /** Stops looking; what is under way ends with the threads and the database it needs. */
  close(): void {
    this.job?.stop();
  }

  private async issueDue(): Promise<void> {
    const { store, clock, reads } = this.kit;
    const scope = Scope.ofGrant(store.state.branches, HEAD_OFFICE);
    const due = this.due(todayIn(scope, clock));
    if (!due) return;
    const begun = beginReport(store, realClock.now().toISOString());
    const parts = await reads.answer('warrantyReportParts', scope, { asOf: due.asOf });
    await store.queue.write(() => this.keep(due, { ...parts, begun }));
  }

  /** The month that is due and not done. */
  private due(today: string): DueMonth | undefined {
    const { unscoped } = this.kit.store;
    const schedule = readSchedule(unscoped);
    if (!schedule?.active) return undefined;
    const due = monthDue(today, schedule.dayOfMonth);
    return due && !findRun(unscoped, due.month) ? due : undefined;
  }

  /**
   * Keeps report, run and mails in one write: after a stop at any moment all of them are there or none. The schedule is read
   * anew, for it may have changed while the report was made; a second run of a month breaks its whole write.
   */
  private keep({ month, asOf }: DueMonth, made: Parameters<typeof keepReport>[1]): void {
    const { store, outbox } = this.kit;
    const schedule = readSchedule(store.unscoped);
    if (!schedule?.active || findRun(store.unscoped, month)) return;
    const report = keepReport(store, made, SYSTEM);
    insertRun(store.unscoped, { month, at: made.begun.at, report });
    for (const person of schedule.people) {
      outbox.queueWarrantyReport(person, { month, report, asOf });
    }
  }
}

import { Cron } from 'croner';
import type { Logger } from 'pino';
import { LookWriter } from '#db/signal-writer';
import { HEAD_OFFICE, Scope } from '#db/scope';
import { realClock, todayIn } from '../clock';
import type { FoundSignal } from '../features/signals/found-signal';
import { reconcile, type Reconciled } from '../features/signals/reconcile';
import type { Kit } from '../kit';

const EVERY_HOUR = '0 * * * *';

type Tools = Pick<Kit, 'store' | 'clock' | 'reads' | 'live'>;

/** What is told when a look has been kept. */
export interface AfterLook {
  check(): Promise<void>;
}

/**
 * Looks at the whole network once a business day, and keeps what it found. It looks at every start and every hour whether the
 * day's look is kept, so that a server that was down catches up; days that went by altogether are not made up, for what a
 * signal tells of is there at the next look too, or over.
 */
export class SignalLooks {
  private job: Cron | undefined;
  private running: Promise<void> | undefined;

  constructor(
    private readonly kit: Tools,
    private readonly log: Logger,
    private readonly after?: AfterLook,
  ) {}

  /** Begins to look. */
  start(): void {
    this.job ??= new Cron(EVERY_HOUR, { unref: true }, () => void this.check());
    void this.check();
  }

  /** Looks if the day's look is not kept yet; what fails is tried again within the hour. */
  check(): Promise<void> {
    this.running ??= this.lookIfDue()
      .catch((error: unknown) => {
        this.log.error({ err: error }, 'the look at signals of the day could not be made');
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

  private async lookIfDue(): Promise<void> {
    const { store, clock, reads } = this.kit;
    const scope = Scope.ofGrant(store.state.branches, HEAD_OFFICE);
    if (scope.branches.length === 0) return;
    const now = clock.now().toISOString();
    const today = todayIn(scope, clock);
    if (new LookWriter(store).hasLook(today)) return;
    const found = await reads.answer('signalLook', scope, { today, now });
    const changed = await store.queue.write(() => this.keep(today, found));
    if (!changed) return;
    this.tell(changed);
    await this.after?.check();
  }

  /** Keeps the look and all it changed in one write: after a stop at any moment all of it is there or none. */
  private keep(day: string, found: readonly FoundSignal[]): Changed | undefined {
    const writer = new LookWriter(this.kit.store);
    if (writer.hasLook(day)) return undefined;
    const standing = writer.standing();
    const changes = reconcile(standing, found);
    writer.keep(day, realClock.now().toISOString(), changes);
    return { ...changes, branchOf: new Map(standing.map(({ id, branchId }) => [id, branchId])) };
  }

  /** Tells open pages which branches have other signals now. */
  private tell({ opened, ended, branchOf }: Changed): void {
    const changed = new Map<number, { count: number; added: number }>();
    const note = (branchId: number, added: number): void => {
      const before = changed.get(branchId) ?? { count: 0, added: 0 };
      changed.set(branchId, { count: before.count + 1, added: before.added + added });
    };
    for (const { branchId } of opened) note(branchId, 1);
    for (const id of ended) note(branchOf.get(id) ?? 0, 0);
    for (const [branchId, counts] of changed) {
      this.kit.live.tell({ kind: 'signals', branchId, ...counts });
    }
  }
}

type Changed = Reconciled & { branchOf: ReadonlyMap<number, number> };

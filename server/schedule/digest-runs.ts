import { Cron } from 'croner';
import type { Logger } from 'pino';
import {
  hasDigestRun,
  hasSignalLook,
  insertDigestRun,
  lastLookTold,
} from '#db/queries/digest-runs';
import { wantsMail } from '#db/queries/mail-choices';
import { listPeople, type Person } from '#db/queries/people';
import { HEAD_OFFICE, Scope } from '#db/scope';
import { issueUnsubscribeToken } from '../auth/unsubscribe-token';
import { readSecret } from '../auth/secret';
import { dayReachedIn, realClock, todayIn } from '../clock';
import type { Digest } from '../features/digests/digest';
import { dueDigests, type DueDigest } from '../features/digests/due-digests';
import type { Kit } from '../kit';
import { makeDigest, type DigestTools } from './make-digest';

const EVERY_HOUR = '0 * * * *';
/** From this hour on, UTC, digests no longer wait for the day's look at signals. */
const WAITS_UNTIL_HOUR = 12;

type Tools = DigestTools & Pick<Kit, 'outbox' | 'config'>;

/** A digest made for a person as they were when it was made. */
interface MadeDigest {
  person: Person;
  digest: Digest;
}

/**
 * Sends digests by themselves: on Mondays the week, on the first of a month the month, to those who may and want to receive
 * them. It looks at every start, every hour and after each look at signals, so that a server that was down catches up, until
 * Thursday and until the 7th. A Monday has come when it has for every branch of the network: the last one's Sunday is over then.
 */
export class DigestRuns {
  private job: Cron | undefined;
  private running: Promise<void> | undefined;
  /** How often it was asked to look. */
  private asked = 0;

  constructor(
    private readonly kit: Tools,
    private readonly log: Logger,
  ) {}

  /** Begins to look. */
  start(): void {
    this.job ??= new Cron(EVERY_HOUR, { unref: true }, () => void this.check());
    void this.check();
  }

  /** Makes what is due and not done; what fails is tried again within the hour. Asked for while it runs, it looks once more. */
  check(): Promise<void> {
    this.asked += 1;
    this.running ??= this.lookUntilDone().finally(() => {
      this.running = undefined;
    });
    return this.running;
  }

  /** Stops looking; what is under way ends with the threads and the database it needs. */
  close(): void {
    this.job?.stop();
  }

  private async lookUntilDone(): Promise<void> {
    let answered: number;
    do {
      answered = this.asked;
      for (const due of this.due()) await this.run(due);
    } while (answered !== this.asked);
  }

  /** Digests that are due and not made; none while the day's look at signals may still come. */
  private due(): DueDigest[] {
    const { store, clock } = this.kit;
    const network = Scope.ofGrant(store.state.branches, HEAD_OFFICE);
    const today = todayIn(network, clock);
    const looked = hasSignalLook(store.unscoped, today);
    if (!looked && clock.now().getUTCHours() < WAITS_UNTIL_HOUR) return [];
    const lookTold = lastLookTold(store.unscoped, 'region_digest');
    return dueDigests(dayReachedIn(network, clock), today, lookTold).filter(
      ({ kind, period }) => !hasDigestRun(store.unscoped, kind, period),
    );
  }

  private async run(due: DueDigest): Promise<void> {
    try {
      // Who was moved or turned off while digests were made must not get figures that are no longer theirs: made anew then.
      while (!(await this.keep(due, await this.make(due)))) continue;
    } catch (error) {
      this.log.error({ err: error, kind: due.kind }, 'digests could not be made');
    }
  }

  private async make(due: DueDigest): Promise<MadeDigest[]> {
    const made: MadeDigest[] = [];
    for (const person of this.receivers(due)) {
      const digest = await makeDigest(this.kit, due, person);
      if (digest) made.push({ person, digest });
    }
    return made;
  }

  /**
   * Keeps mails and run in one write: after a stop at any moment all of them are there or none. Says whether everybody still is
   * who they were when their digest was made.
   */
  private keep(due: DueDigest, made: readonly MadeDigest[]): Promise<boolean> {
    const { store, outbox, config } = this.kit;
    const { kind, period } = due;
    const key = readSecret(config).mails;
    return store.queue.write(() => {
      const now = new Map(this.receivers(due).map((person) => [person.id, placeOf(person)]));
      if (made.some(({ person }) => now.get(person.id) !== placeOf(person))) return false;
      if (hasDigestRun(store.unscoped, kind, period)) return true;
      for (const { person, digest } of made) {
        const token = issueUnsubscribeToken(key, { personId: person.id, kind });
        outbox.queueDigest(person, digest, token);
      }
      const at = realClock.now().toISOString();
      insertDigestRun(store.unscoped, { kind, period, at, mails: made.length });
      return true;
    });
  }

  /** Who gets a kind of digest: active, of its role, wanting it, and signed in before, for figures go to no address nobody answered from. */
  private receivers({ kind }: DueDigest): Person[] {
    const db = this.kit.store.unscoped;
    return listPeople(db).filter(
      (person) => person.active && !person.invited && wantsMail(db, person, kind),
    );
  }
}

/** What a person's figures and letter depend on. */
function placeOf({ email, name, role, regions, branches }: Person): string {
  return JSON.stringify([email, name, role, regions, branches]);
}

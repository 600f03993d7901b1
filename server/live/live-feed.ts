import type { Response } from 'express';
import { findSignedIn } from '#db/queries/sign-ins';
import { Scope, type Grant } from '#db/scope';
import type { Store } from '#db/store';
import type { LiveEvent } from '#shared/contracts/live';
import type { PersonCaller } from '../auth/caller';
import { realClock } from '../clock';
import { LiveStream } from './live-stream';

/** A change that is committed. */
export interface LiveChange {
  kind: LiveEvent['kind'];
  branchId: number;
  count: number;
  /** How many of them are new; none when left out. */
  added?: number;
  /** The person who did it, when one did. */
  by?: number;
}

/** How fast the feed goes, ms. */
export interface Paces {
  /** Changes of a branch within so long leave as one. */
  join: number;
  /** Between two comments; a sign-in that has ended is noticed by then. */
  breath: number;
}

const PACES: Paces = { join: 250, breath: 20_000 };
/** Streams that one person may hold, over all windows and devices; the oldest makes room. */
const MOST_STREAMS = 8;

/** What changed at a branch within one wait: who did how much of it. */
interface Joined {
  readonly kind: LiveEvent['kind'];
  readonly branchId: number;
  readonly byPerson: Map<number | undefined, Amount>;
}
type Amount = Pick<LiveEvent, 'count' | 'added'>;

interface Follower {
  caller: PersonCaller;
  stream: LiveStream;
}

/**
 * Tells open pages that something changed in a branch they may see. What the store commits of jobs and claims comes here by
 * itself. Before every event each follower is judged by the person as stored now (rule 64).
 */
export class LiveFeed {
  private readonly followers = new Set<Follower>();
  private readonly pending = new Map<string, Joined>();
  private joining: NodeJS.Timeout | undefined;
  private breathing: NodeJS.Timeout | undefined;
  private closed = false;

  constructor(
    private readonly store: Store,
    private readonly paces: Paces = PACES,
  ) {
    store.changes.listen((changes) => changes.forEach((change) => this.tell(change)));
  }

  /** Says that something has changed; call it after the commit. Followers hear of it within a quarter of a second. */
  tell({ kind, branchId, count, added = 0, by }: LiveChange): void {
    // Who opens a page later reads it anew.
    if (this.followers.size === 0) return;
    const key = `${kind} ${branchId}`;
    const joined = this.pending.get(key) ?? { kind, branchId, byPerson: new Map() };
    joined.byPerson.set(by, sum([joined.byPerson.get(by), { count, added }]));
    this.pending.set(key, joined);
    this.joining ??= setTimeout(() => this.passOn(), this.paces.join);
    this.joining.unref();
  }

  /** Keeps a response open for a person and settles when it is over. */
  follow(caller: PersonCaller, response: Response): Promise<void> {
    const follower = { caller, stream: new LiveStream(response) };
    this.makeRoomFor(caller.id);
    this.followers.add(follower);
    this.breathing ??= setInterval(() => this.breathe(), this.paces.breath).unref();
    if (this.closed) this.end(follower);
    return follower.stream.over.then(() => this.forget(follower));
  }

  /** Ends every stream and takes no more. */
  close(): void {
    this.closed = true;
    clearTimeout(this.joining);
    for (const follower of this.followers) this.end(follower);
  }

  private passOn(): void {
    const changes = [...this.pending.values()];
    this.pending.clear();
    this.joining = undefined;
    for (const follower of this.followers) {
      const person = this.personNow(follower);
      if (!person) continue;
      const scope = Scope.ofGrant(this.store.state.branches, person);
      for (const { kind, branchId, byPerson } of changes) {
        if (kind === 'signals' && person.role === 'recorder') continue;
        const branch = scope.branches.find(({ id }) => id === branchId)?.code;
        if (branch === undefined) continue;
        const { theirs, others } = parted(byPerson, follower.caller.id);
        // Nobody is told whose the others' are, only that these are their own.
        if (others.count > 0) follower.stream.send({ kind, branch, ...others });
        if (theirs.count > 0) follower.stream.send({ kind, branch, ...theirs, own: true });
      }
    }
  }

  private breathe(): void {
    for (const follower of this.followers) {
      if (this.personNow(follower)) follower.stream.breathe();
    }
  }

  /** The person as stored now; ends the stream of one whose token or sign-in is over, or who is no longer active. */
  private personNow(follower: Follower): Grant | undefined {
    const { id, signInId, tokenEndsAt } = follower.caller;
    const now = realClock.now();
    const token = { personId: id, signInId };
    const person =
      now < tokenEndsAt ? findSignedIn(this.store.unscoped, token, now.toISOString()) : undefined;
    if (!person) this.end(follower);
    return person;
  }

  private makeRoomFor(personId: number): void {
    const own = [...this.followers].filter(({ caller }) => caller.id === personId);
    for (const oldest of own.slice(0, Math.max(0, own.length - MOST_STREAMS + 1))) this.end(oldest);
  }

  private end(follower: Follower): void {
    this.forget(follower);
    follower.stream.end();
  }

  private forget(follower: Follower): void {
    this.followers.delete(follower);
    if (this.followers.size > 0) return;
    clearInterval(this.breathing);
    this.breathing = undefined;
  }
}

function parted(byPerson: Joined['byPerson'], person: number): { theirs: Amount; others: Amount } {
  const rest = [...byPerson].filter(([by]) => by !== person);
  return { theirs: sum([byPerson.get(person)]), others: sum(rest.map(([, amount]) => amount)) };
}

function sum(amounts: readonly (Amount | undefined)[]): Amount {
  return amounts.reduce<Amount>(
    (all, amount) => ({
      count: all.count + (amount?.count ?? 0),
      added: all.added + (amount?.added ?? 0),
    }),
    { count: 0, added: 0 },
  );
}

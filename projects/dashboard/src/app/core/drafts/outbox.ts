import {
  computed,
  DestroyRef,
  DOCUMENT,
  effect,
  inject,
  Injectable,
  signal,
  untracked,
} from '@angular/core';
import { firstValueFrom } from 'rxjs';
import { getHealth } from '#shared/contracts/system';
import { Api } from '../api/api';
import { ProblemError } from '../api/problem';
import { Line } from '../offline/line';
import { Session } from '../session/session';
import type { DeviceDraft } from './device-draft';
import { Drafts } from './drafts';
import { jobOfDraft } from './job-of-draft';
import { keepUnderWayOf } from './keep-under-way';
import type { QueuedJob } from './queued-job';
import { RETRY_PACE } from './retry-pace';
import { photosToRepeat, sendPhotos } from './send-photos';
import { SendQueue } from './send-queue';
import { inTurn } from './sending-turn';
import { photosLeft } from './unsent-in';
import { withTimersStopped } from './timers';

/** What is to be seen of the queue at any time. */
export interface OutboxState {
  /** Jobs handed over and not yet with the server. */
  readonly waiting: number;
  /** Jobs that the server refused. */
  readonly refused: number;
  /** Photos of sent jobs still on the device. */
  readonly photosWaiting: number;
  readonly sending: boolean;
  readonly line: 'up' | 'down';
  /** Set when nothing can go out before the person has signed in again. */
  readonly signedOut: boolean;
}

/** Sends what was handed over, in order, once, whenever there is a line. */
@Injectable({ providedIn: 'root' })
export class JobOutbox {
  private readonly api = inject(Api);
  private readonly drafts = inject(Drafts);
  private readonly line = inject(Line);
  private readonly pace = inject(RETRY_PACE);
  private readonly queue = inject(SendQueue);
  private readonly session = inject(Session);
  private readonly going = signal(false);
  private busy = false;
  /** Rounds in a row that ended without getting everything across. */
  private stalls = 0;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private again = false;

  readonly state = computed<OutboxState>(() => {
    const drafts = this.drafts.list();
    const inState = (...states: readonly DeviceDraft['state'][]): readonly DeviceDraft[] =>
      drafts.filter(({ state }) => states.includes(state));
    return {
      waiting: inState('waiting', 'sending').length,
      refused: inState('refused').length,
      photosWaiting: inState('sent').reduce((all, draft) => all + photosLeft(draft), 0),
      sending: this.going(),
      line: this.line.down() ? 'down' : 'up',
      signedOut: this.session.person() === undefined,
    };
  });

  constructor() {
    const document = inject(DOCUMENT);
    const seen = (): void => {
      if (document.visibilityState === 'visible') this.tryNow();
    };
    document.addEventListener('visibilitychange', seen);
    inject(DestroyRef).onDestroy(() => {
      document.removeEventListener('visibilitychange', seen);
      clearTimeout(this.timer);
    });
    // A line come back, a person signed in, and the first look at what was left here are each a reason to try.
    effect(() => {
      this.line.returns();
      if (this.session.person() && this.drafts.ready()) untracked(() => this.tryNow());
    });
  }

  /** Hands a draft over: it is sent now or when there is a line. Settles when it is durably queued. */
  async send(draftId: string): Promise<void> {
    const draft = this.drafts.find(draftId);
    if (!draft || draft.state === 'sending' || draft.state === 'sent') return;
    const now = new Date();
    const made = jobOfDraft(draft.content, now);
    const unnamed = draft.jobRef.trim() === '';
    if ('missing' in made || unnamed) {
      const fields = [
        ...(unnamed ? [{ path: '/jobRef', message: 'is required' }] : []),
        ...('missing' in made ? made.missing : []),
      ];
      throw new ProblemError({ status: 422, sentence: INCOMPLETE, fields });
    }
    // First what goes out: a job shown as waiting must be there to be sent.
    await this.queue.add(draft, JSON.stringify(made.job), now);
    await this.drafts.mark(draftId, ({ content, jobRef }) => ({
      // What is shown is what is sent: the timers stop here.
      content: withTimersStopped(content, now),
      jobRef: jobRef.trim(),
      state: 'waiting',
      problem: undefined,
    }));
    this.tryNow();
  }

  /** Keeps a draft on the server as under way, for colleagues; with its photos. Needs a line; throws what went wrong as a `Problem`. */
  async keepOnServer(draftId: string): Promise<void> {
    const draft = this.drafts.find(draftId);
    if (!draft) return;
    const keptAs = await keepUnderWayOf(this.api, draft);
    await this.drafts.mark(draftId, () => ({ keptAs }));
    const problem = await sendPhotos(this.api, this.drafts, draft);
    if (problem) throw new ProblemError(problem);
  }

  /** Tries at once instead of waiting for the next try. */
  tryNow(): void {
    void this.round();
  }

  /** One round: everything that is left, in turn with other windows; then the next round is set. */
  private async round(): Promise<void> {
    this.again = this.busy;
    if (this.busy) return;
    clearTimeout(this.timer);
    this.busy = true;
    let done = false;
    try {
      await this.drafts.whenRead();
      done = (await inTurn(() => this.sendAll())) ?? false;
    } finally {
      this.busy = false;
      this.going.set(false);
      this.stalls = done ? 0 : this.stalls + 1;
      // Asked for while this round was under way.
      if (this.again) this.tryNow();
      else if (!done) this.timer = setTimeout(() => void this.round(), this.pace(this.stalls));
    }
  }

  /** Sends what can be sent; tells whether that was all. */
  private async sendAll(): Promise<boolean> {
    const jobs = await this.queue.due();
    if (jobs.length === 0 && this.withPhotos().length === 0) return this.reached();
    // Without a token the call would end the sign-in on the page that is open; so it is asked for first.
    if ((await this.session.usableToken()) === undefined) return false;
    this.going.set(true);
    let all = true;
    for (const job of jobs) {
      const sent = await this.queue.send(job);
      if (sent.kind === 'accepted') await this.repeatPhotos(job);
      if (sent.kind !== 'later') continue;
      all = false;
      // One job that the server cannot take just now does not hold up the others; no line does.
      if (sent.problem.status === 0) return this.unheard();
    }
    for (const draft of this.withPhotos()) {
      const problem = await sendPhotos(this.api, this.drafts, draft);
      if (problem) all = false;
      if (problem?.status === 0) return this.unheard();
    }
    return all;
  }

  private withPhotos(): readonly DeviceDraft[] {
    return this.drafts.list().filter((draft) => draft.state === 'sent' && photosLeft(draft) > 0);
  }

  /** With nothing to send, asks only whether a line that was gone is back, so that the words about it come true. */
  private async reached(): Promise<boolean> {
    if (!this.line.down()) return true;
    await firstValueFrom(this.api.call(getHealth, {})).catch(() => undefined);
    return !this.line.down();
  }

  private unheard(): false {
    this.line.silent();
    return false;
  }

  private async repeatPhotos({ draft: id }: QueuedJob): Promise<void> {
    const draft = this.drafts.find(id);
    if (draft?.keptAs === undefined) return;
    const repeat = await photosToRepeat(this.api, draft);
    if (repeat.length === 0) return;
    await this.drafts.mark(id, ({ photos }) => ({
      photos: photos.map((one) => (repeat.includes(one.id) ? { ...one, state: 'here' } : one)),
    }));
  }
}

const INCOMPLETE =
  'Some of this job is still missing. It is kept on this device; fill in what is named.';

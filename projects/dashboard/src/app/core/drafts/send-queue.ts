import { inject, Injectable } from '@angular/core';
import { Api } from '../api/api';
import type { DeviceDraft } from './device-draft';
import { DeviceStore } from './device-store';
import { Drafts } from './drafts';
import { noted, type QueuedJob } from './queued-job';
import { sendJob, type Sent } from './send-job';

/** The jobs handed over on this device, as they will go out, and how sending one is told to its draft. */
@Injectable({ providedIn: 'root' })
export class SendQueue {
  private readonly api = inject(Api);
  private readonly drafts = inject(Drafts);
  private readonly store = inject(DeviceStore);

  /** Puts a job last; what went out of it before and may have arrived goes along. */
  async add(draft: DeviceDraft, body: string, now: Date): Promise<void> {
    await this.store.update('queue', draft.id, (before) => ({
      draft: draft.id,
      personId: draft.personId,
      branch: draft.branch,
      jobRef: draft.jobRef.trim(),
      body,
      corrects: draft.corrects,
      queuedAt: now.toISOString(),
      perhapsThere: before?.perhapsThere ?? [],
    }));
  }

  /** What is to be sent now, in the order handed over. One taken back to be changed is not. */
  async due(): Promise<readonly QueuedJob[]> {
    const waits = (job: QueuedJob): boolean => {
      const state = this.drafts.find(job.draft)?.state;
      // Still `sending` when nobody sends: its window was closed on the way.
      return state === 'waiting' || state === 'sending';
    };
    const all = await this.store.all('queue');
    return all.filter(waits).sort((a, b) => (a.queuedAt < b.queuedAt ? -1 : 1));
  }

  /** Sends one and tells its draft how that ended. */
  async send(job: QueuedJob): Promise<Sent> {
    // Noted before it goes: a phone that dies now must know later that this may have arrived.
    const going = await this.store.update('queue', job.draft, (kept) => kept && noted(kept));
    if (!going) return TAKEN_BACK;
    await this.drafts.mark(job.draft, ({ state }) => ({
      state: state === 'waiting' ? 'sending' : state,
    }));
    const sent = await sendJob(this.api, { ...going, perhapsThere: job.perhapsThere });
    await this.drafts.mark(job.draft, (draft) => stateAfter(sent, draft));
    if (sent.kind === 'accepted') await this.done(job);
    return sent;
  }

  /** Forgets what was sent, unless it was handed over anew meanwhile. */
  private async done(job: QueuedJob): Promise<void> {
    await this.store.update('queue', job.draft, (kept) =>
      kept?.queuedAt === job.queuedAt ? undefined : kept,
    );
  }
}

/** Removed from the device in another window between two jobs of a round: nothing to send, nobody to tell. */
const TAKEN_BACK: Sent = {
  kind: 'refused',
  problem: { status: 410, sentence: 'This job is no longer on this device.', fields: [] },
};

function stateAfter(sent: Sent, draft: DeviceDraft): Partial<DeviceDraft> {
  const untouched = draft.state === 'sending';
  switch (sent.kind) {
    case 'accepted':
      // Written on while it was on its way: the rest is a correction of what has arrived.
      return untouched
        ? {
            state: 'sent',
            problem: undefined,
            sentAt: new Date().toISOString(),
            sentAs: sent.etag,
          }
        : { corrects: sent.etag };
    case 'refused':
      return untouched ? { state: 'refused', problem: sent.problem } : {};
    case 'later':
      return untouched ? { state: 'waiting' } : {};
  }
}

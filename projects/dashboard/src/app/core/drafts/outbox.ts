import { Injectable, signal } from '@angular/core';

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
}

/** Sends what was handed over, in order, once, whenever there is a line. */
@Injectable({ providedIn: 'root' })
export class JobOutbox {
  readonly state = signal<OutboxState>({
    waiting: 0,
    refused: 0,
    photosWaiting: 0,
    sending: false,
    line: 'up',
  }).asReadonly();

  /** Hands a draft over: it is sent now or when there is a line. Settles when it is durably queued. */
  send(_draftId: string): Promise<void> {
    throw new Error('not built yet');
  }

  /** Keeps a draft on the server as under way, for colleagues; with its photos. Needs a line; throws what went wrong as a `Problem`. */
  keepOnServer(_draftId: string): Promise<void> {
    throw new Error('not built yet');
  }

  /** Tries at once instead of waiting for the next try. */
  tryNow(): void {}
}

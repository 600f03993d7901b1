import type { JobDraft } from '#shared/contracts/under-way';
import type { Problem } from '../api/problem';

/**
 * Where a job written on this device stands.
 * - `editing`: being written.
 * - `waiting`: handed over to be sent; goes out as soon as there is a line.
 * - `sending`: on its way.
 * - `refused`: the server said why it cannot be taken; nothing is lost, it is to be mended and sent again.
 * - `sent`: the server has it; photos may still be on their way.
 */
export type DraftState = 'editing' | 'waiting' | 'sending' | 'refused' | 'sent';

/** A photo on this device, of a finding or of the car as a whole. */
export interface DevicePhoto {
  /** Its reference, made here once; sending it twice keeps one. */
  readonly id: string;
  readonly finding: string | null;
  readonly state: 'here' | 'sent' | 'refused';
  readonly problem?: string;
}

/** A job as written on this device. Kept in IndexedDB under its `id` until it is sent. */
export interface DeviceDraft {
  readonly id: string;
  /** Whose it is: others who sign in on the device do not see it. */
  readonly personId: number;
  readonly branch: string;
  /** The branch's reference; empty until typed. */
  readonly jobRef: string;
  readonly content: JobDraft;
  readonly photos: readonly DevicePhoto[];
  /** Set for a correction: the ETag of the revision it was made from. A new job is sent with If-None-Match. */
  readonly corrects: string | undefined;
  /** ETag of the job under way on the server that this continues, if it was kept there. */
  readonly keptAs: string | undefined;
  readonly state: DraftState;
  readonly problem: Problem | undefined;
  /** The step of the form last stood at, from 0. */
  readonly step: number;
  /** ISO instant. */
  readonly changedAt: string;
  /** When the server was heard to have it, and the ETag it has it under; set once `sent`. */
  readonly sentAt?: string;
  readonly sentAs?: string;
  /** Photos that the server has and that were taken off here since; taken off there with the next sending. */
  readonly photosGone?: readonly string[];
}

/** What a form may change of a draft. */
export type DraftChange = Partial<
  Pick<DeviceDraft, 'branch' | 'jobRef' | 'content' | 'step' | 'corrects' | 'keptAs'>
>;

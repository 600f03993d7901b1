import { inject, Injectable } from '@angular/core';
import { Session } from '../session/session';
import { askToKeep } from './ask-to-keep';
import type { ClaimDevicePhoto, ClaimDraft, ClaimDraftChange, TypedClaim } from './claim-draft';
import { DeviceStore } from './device-store';
import { newId } from './new-id';
import { readPhoto } from './photo-check';
import { type AheadPlace, WrittenAhead } from './written-ahead';

/** The job on which a claim is written. */
export interface ClaimedJob {
  readonly branch: string;
  readonly jobRef: string;
}

/** Claims being written by the person signed in, kept on this device. */
@Injectable({ providedIn: 'root' })
export class ClaimDrafts {
  private readonly session = inject(Session);
  private readonly store = inject(DeviceStore);
  private readonly ahead = inject(WrittenAhead);
  /** Writes follow one another in the order in which they were asked for. */
  private writing: Promise<unknown> = Promise.resolve();

  /** Why nothing can be kept on this device (storage refused or full), or undefined. */
  readonly trouble = this.store.trouble;

  /** The claim being written on a job, or undefined. */
  async find(job: ClaimedJob): Promise<ClaimDraft | undefined> {
    await this.writing;
    await this.takeUp(job);
    const key = this.keyOf(job);
    return key === undefined ? undefined : this.store.get('claims', key);
  }

  /**
   * Changes what is kept, or begins it with `typed`; gives the draft as kept then. A page that goes before it is kept leaves a
   * note of what was typed.
   */
  change(job: ClaimedJob, change: ClaimDraftChange): Promise<ClaimDraft | undefined> {
    const written = this.write(job, (kept) => {
      const begun = kept ?? (change.typed && this.begun(job, change.typed));
      return begun && { ...begun, ...change, changedAt: new Date().toISOString() };
    });
    const place = this.noteOf(job);
    if (place && change.typed) void this.ahead.note(place, change.typed, later, written);
    return written;
  }

  /** Adds a photo taken or chosen. Throws a `PhotoRefused` with a sentence when it is no JPEG or PNG or too large. */
  async addPhoto(job: ClaimedJob, typed: TypedClaim, file: Blob): Promise<ClaimDraft | undefined> {
    const read = await readPhoto(file);
    const photo: ClaimDevicePhoto = { id: newId(), state: 'here' };
    // First the bytes: a photo named in a draft must be there.
    await this.store.update('photos', this.placeOf(job, photo.id), () => read);
    return this.write(job, (kept) => {
      const draft = kept ?? this.begun(job, typed);
      return draft && { ...draft, photos: [...draft.photos, photo] };
    });
  }

  /** The photo's bytes, to show or send it. */
  async photo(job: ClaimedJob, photo: string): Promise<Blob | undefined> {
    const kept = await this.store.get('photos', this.placeOf(job, photo));
    return kept && new Blob([kept.bytes], { type: kept.type });
  }

  /** Sets what sending found out about a photo. */
  markPhoto(
    job: ClaimedJob,
    photo: string,
    found: Pick<ClaimDevicePhoto, 'state' | 'problem'>,
  ): Promise<ClaimDraft | undefined> {
    return this.write(
      job,
      (kept) =>
        kept && {
          ...kept,
          photos: kept.photos.map((one) => (one.id === photo ? { id: one.id, ...found } : one)),
        },
    );
  }

  async removePhoto(job: ClaimedJob, photo: string): Promise<ClaimDraft | undefined> {
    await this.store.update('photos', this.placeOf(job, photo), () => undefined);
    return this.write(
      job,
      (kept) => kept && { ...kept, photos: kept.photos.filter(({ id }) => id !== photo) },
    );
  }

  /** Takes a claim and its photos off the device. */
  async forget(job: ClaimedJob): Promise<void> {
    const photos = (await this.find(job))?.photos ?? [];
    await this.write(job, () => undefined);
    const place = this.noteOf(job);
    if (place) this.ahead.forget(place);
    for (const { id } of photos) {
      await this.store.update('photos', this.placeOf(job, id), () => undefined);
    }
  }

  /** Writes what a window gone had typed and did not see kept. */
  private async takeUp(job: ClaimedJob): Promise<void> {
    const place = this.noteOf(job);
    if (!place) return;
    const notes = this.ahead.left<TypedClaim>('claim', place.personId);
    for (const { change: typed, drop } of notes.filter(({ id }) => id === place.id)) {
      await this.change(job, { typed });
      drop();
    }
  }

  private noteOf({ branch, jobRef }: ClaimedJob): AheadPlace | undefined {
    const personId = this.session.person()?.id;
    return personId === undefined
      ? undefined
      : { kind: 'claim', personId, id: `${branch} ${jobRef}` };
  }

  private begun({ branch, jobRef }: ClaimedJob, typed: TypedClaim): ClaimDraft | undefined {
    const personId = this.session.person()?.id;
    if (personId === undefined) return undefined;
    askToKeep();
    const changedAt = new Date().toISOString();
    return { personId, branch, jobRef, typed, photos: [], changedAt };
  }

  private write(
    job: ClaimedJob,
    change: (kept: ClaimDraft | undefined) => ClaimDraft | undefined,
  ): Promise<ClaimDraft | undefined> {
    const key = this.keyOf(job);
    if (key === undefined) return Promise.resolve(undefined);
    const written = this.writing.then(() => this.store.update('claims', key, change));
    this.writing = written.catch(() => undefined);
    return written;
  }

  private keyOf({ branch, jobRef }: ClaimedJob): string | undefined {
    const personId = this.session.person()?.id;
    return personId === undefined ? undefined : `claim ${personId} ${branch} ${jobRef}`;
  }

  private placeOf(job: ClaimedJob, photo: string): string {
    return `${this.keyOf(job) ?? 'nobody'} ${photo}`;
  }
}

/** What a form holds is noted whole: the later one says it all. */
function later(_earlier: TypedClaim, typed: TypedClaim): TypedClaim {
  return typed;
}

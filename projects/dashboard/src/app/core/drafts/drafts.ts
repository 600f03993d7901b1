import { Injectable, signal } from '@angular/core';
import type { DeviceDraft, DraftChange } from './device-draft';

/** The drafts of the person signed in, kept on this device. */
@Injectable({ providedIn: 'root' })
export class Drafts {
  private readonly kept = signal<readonly DeviceDraft[]>([]);
  /** All of them, the last changed first; `undefined` until read from the device. */
  readonly list = this.kept.asReadonly();
  /** Why nothing can be kept on this device (storage refused or full), or undefined. */
  readonly trouble = signal<string | undefined>(undefined).asReadonly();

  /** Begins a draft and keeps it. */
  begin(_branch: string, _from: DraftChange = {}): Promise<DeviceDraft> {
    throw new Error('not built yet');
  }

  /** The draft of an id, newest state, or undefined. */
  find(_id: string): DeviceDraft | undefined {
    throw new Error('not built yet');
  }

  /** Changes a draft; visible in `list` at once, durable when settled. Changing a waiting or refused one makes it `editing` again. */
  change(_id: string, _change: DraftChange): Promise<void> {
    throw new Error('not built yet');
  }

  /** Removes a draft and its photos from the device. */
  remove(_id: string): Promise<void> {
    throw new Error('not built yet');
  }

  /** Adds a photo taken or chosen; gives its id. Throws a `PhotoRefused` with a sentence when it is no JPEG or PNG or too large. */
  addPhoto(_id: string, _finding: string | null, _file: Blob): Promise<string> {
    throw new Error('not built yet');
  }

  /** The photo's bytes, to show it. */
  photo(_id: string, _photo: string): Promise<Blob | undefined> {
    throw new Error('not built yet');
  }

  removePhoto(_id: string, _photo: string): Promise<void> {
    throw new Error('not built yet');
  }
}

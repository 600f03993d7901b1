import {
  computed,
  effect,
  inject,
  Injectable,
  linkedSignal,
  signal,
  untracked,
} from '@angular/core';
import { Session } from '../session/session';
import { askToKeep } from './ask-to-keep';
import type { DeviceDraft, DevicePhoto, DraftChange } from './device-draft';
import { DeviceStore } from './device-store';
import { mergeChange, touchesContent } from './merge-change';
import { newId } from './new-id';
import { readPhoto } from './photo-check';
import { UnsentHere } from './unsent-here';
import { isOver, unsentIn } from './unsent-in';
import { otherWindows } from './windows';
import { type AheadPlace, WrittenAhead } from './written-ahead';

const TWO_WINDOWS =
  'This job was changed in two windows at once. Both versions are kept, each as a job of its own: remove the one that is not right.';

/** The drafts of the person signed in, kept on this device. */
@Injectable({ providedIn: 'root' })
export class Drafts {
  private readonly session = inject(Session);
  private readonly store = inject(DeviceStore);
  private readonly unsent = inject(UnsentHere);
  private readonly ahead = inject(WrittenAhead);
  private readonly windows = otherWindows(() => void this.read());
  /** Whoever signed in last: a sign-in that ends by itself must not take away what is being written. */
  private readonly owner = linkedSignal<number | undefined, number | undefined>({
    source: () => this.session.person()?.id,
    computation: (id, before) => id ?? before?.value,
  });
  private readonly kept = signal<readonly DeviceDraft[]>([]);
  private readonly told = signal<string | undefined>(undefined);
  private readonly readFor = signal<number | undefined>(undefined);
  /** Writes follow one another in the order in which they were asked for. */
  private writing: Promise<unknown> = Promise.resolve();
  private changes = 0;

  /** All of them, the last changed first; empty until `ready`. */
  readonly list = this.kept.asReadonly();
  /** Whether the device has been read. */
  readonly ready = computed(() => this.owner() !== undefined && this.readFor() === this.owner());
  /** Why nothing can be kept on this device (storage refused or full), or undefined. */
  readonly trouble = this.store.trouble;
  /** Something to know about a draft that changed by itself, until `noticed`. */
  readonly notice = this.told.asReadonly();

  constructor() {
    effect(() => {
      this.owner();
      void untracked(() => this.read());
    });
  }

  /** Settles once the drafts of the person signed in have been read from the device. */
  async whenRead(): Promise<void> {
    if (!this.ready()) await this.read();
  }

  noticed(): void {
    this.told.set(undefined);
  }

  /** Begins a draft and keeps it. */
  async begin(branch: string, from: DraftChange = {}): Promise<DeviceDraft> {
    const personId = this.owner();
    if (personId === undefined) throw new Error('a draft belongs to a person signed in');
    const draft: DeviceDraft = {
      jobRef: '',
      content: {},
      corrects: undefined,
      keptAs: undefined,
      step: 0,
      branch,
      ...from,
      id: newId(),
      personId,
      photos: [],
      state: 'editing',
      problem: undefined,
      changedAt: new Date().toISOString(),
    };
    askToKeep();
    this.show(draft);
    await this.write(draft.id, () => draft);
    return draft;
  }

  /** The draft of an id, newest state, or undefined. */
  find(id: string): DeviceDraft | undefined {
    return this.kept().find((draft) => draft.id === id);
  }

  /**
   * Changes a draft; visible in `list` at once, durable when settled; a page that goes before that leaves a note of it. Changing
   * a waiting or refused one makes it `editing` again. `from` is the draft as the form last took it over or wrote it: what another window changed since then stays.
   */
  async change(id: string, change: DraftChange, from?: DeviceDraft): Promise<void> {
    const shown = this.find(id);
    if (!shown) return;
    const seen = from ?? shown;
    const changed = (onto: DeviceDraft): { draft: DeviceDraft; clash: boolean } => {
      const { draft, clash } = mergeChange(onto, seen, change);
      const reopened = touchesContent(change) ? reopenedFrom(onto) : {};
      return { draft: { ...draft, ...reopened, changedAt: new Date().toISOString() }, clash };
    };
    this.show(changed(shown).draft);
    let other: DeviceDraft | undefined;
    const written = this.write(id, (kept) => {
      const { draft, clash } = changed(kept ?? shown);
      other = clash ? kept : undefined;
      return draft;
    });
    void this.ahead.note(placeOf(shown), { from: seen, change }, joined, written);
    await written;
    if (other) await this.keepApart(other);
  }

  /** Sets what sending found out; of the draft as it is kept by now. */
  async mark(id: string, what: (draft: DeviceDraft) => Partial<DeviceDraft>): Promise<void> {
    const shown = this.find(id);
    if (shown) this.show({ ...shown, ...what(shown) });
    await this.write(id, (kept) => kept && { ...kept, ...what(kept) });
  }

  /** Removes a draft and its photos from the device. */
  async remove(id: string): Promise<void> {
    const photos = this.find(id)?.photos ?? [];
    const personId = this.owner();
    this.set(this.kept().filter((draft) => draft.id !== id));
    if (personId !== undefined) this.ahead.forget({ kind: 'job', personId, id });
    await Promise.all([
      this.write(id, () => undefined),
      this.store.update('queue', id, () => undefined),
      ...photos.map((photo) => this.dropBytes(id, photo.id)),
    ]);
  }

  /** Adds a photo taken or chosen; gives its id. Throws a `PhotoRefused` with a sentence when it is no JPEG or PNG or too large. */
  async addPhoto(id: string, finding: string | null, file: Blob): Promise<string> {
    const read = await readPhoto(file);
    const photo: DevicePhoto = { id: newId(), finding, state: 'here' };
    // First the bytes: a photo named in a draft must be there.
    await this.store.update('photos', bytesOf(id, photo.id), () => read);
    await this.mark(id, (draft) => ({ photos: [...draft.photos, photo] }));
    return photo.id;
  }

  /** The photo's bytes, to show it; not of one that was sent with its job. */
  async photo(id: string, photo: string): Promise<Blob | undefined> {
    const kept = await this.store.get('photos', bytesOf(id, photo));
    return kept && new Blob([kept.bytes], { type: kept.type });
  }

  async removePhoto(id: string, photo: string): Promise<void> {
    await this.mark(id, ({ photos, photosGone = [] }) => ({
      photos: photos.filter((one) => one.id !== photo),
      photosGone: photos.some((one) => one.id === photo && one.state === 'sent')
        ? [...photosGone, photo]
        : photosGone,
    }));
    await this.dropBytes(id, photo);
  }

  /** Frees the room of a photo that the server has. */
  async dropBytes(id: string, photo: string): Promise<void> {
    await this.store.update('photos', bytesOf(id, photo), () => undefined);
  }

  /** Reads the device again, as it is once everything asked for before has been written. */
  private async read(): Promise<void> {
    const owner = this.owner();
    let before: number;
    let found: DeviceDraft[];
    do {
      await this.writing;
      before = this.changes;
      found = await this.store.all('drafts');
    } while (before !== this.changes);
    if (owner !== this.owner()) return;
    const own = found.filter(({ personId }) => personId === owner);
    const over = own.filter((draft) => isOver(draft, new Date()));
    this.set(own.filter((draft) => !over.includes(draft)));
    const first = this.readFor() !== owner;
    this.readFor.set(owner);
    if (first && owner !== undefined) await this.takeUp(owner);
    for (const draft of over) await this.remove(draft.id);
  }

  /** Changes what a window gone was about to change. Shown before anything else has a turn: forms open with it. */
  private async takeUp(owner: number): Promise<void> {
    const notes = this.ahead.left<NotedChange>('job', owner);
    const changes = notes.flatMap(({ id, change: { change, from } }) => {
      const shown = this.find(id);
      const isThere = !shown || saysTheSame(mergeChange(shown, from, change).draft, shown);
      return isThere ? [] : [this.change(id, change, from)];
    });
    await Promise.all(changes);
    for (const note of notes) note.drop();
  }

  private async write(
    id: string,
    change: (kept: DeviceDraft | undefined) => DeviceDraft | undefined,
  ): Promise<void> {
    const turn = ++this.changes;
    const written = this.writing.then(() => this.store.update('drafts', id, change));
    this.writing = written.catch(() => undefined);
    const kept = await written;
    this.windows.tell();
    // What another window had changed is seen here from now on, unless more was written here meanwhile.
    if (kept && turn === this.changes) this.show(kept);
  }

  private async keepApart(other: DeviceDraft): Promise<void> {
    const copy: DeviceDraft = {
      ...other,
      id: newId(),
      photos: [],
      state: 'editing',
      problem: undefined,
    };
    this.told.set(TWO_WINDOWS);
    this.set([...this.kept(), copy]);
    await this.write(copy.id, () => copy);
  }

  private show(draft: DeviceDraft): void {
    this.set([...this.kept().filter(({ id }) => id !== draft.id), draft]);
  }

  private set(drafts: readonly DeviceDraft[]): void {
    this.kept.set([...drafts].sort((a, b) => (a.changedAt < b.changedAt ? 1 : -1)));
    const owner = this.owner();
    if (owner !== undefined) this.unsent.count(owner, unsentIn(drafts));
  }
}

/** A change noted before it is written, and the draft it was made to. */
interface NotedChange {
  readonly from: DeviceDraft;
  readonly change: DraftChange;
}

/** Changes of one draft one after the other, as one. */
function joined(earlier: NotedChange, later: NotedChange): NotedChange {
  return { from: earlier.from, change: { ...earlier.change, ...later.change } };
}

function placeOf({ personId, id }: DeviceDraft): AheadPlace {
  return { kind: 'job', personId, id };
}

function saysTheSame(one: DeviceDraft, other: DeviceDraft): boolean {
  return JSON.stringify(one) === JSON.stringify(other);
}

/** A job changed after it was handed over is written again; one that the server has becomes a correction of it. */
function reopenedFrom(draft: DeviceDraft): Partial<DeviceDraft> {
  if (draft.state === 'editing') return {};
  const sent = draft.state === 'sent';
  return { state: 'editing', problem: undefined, ...(sent && { corrects: draft.sentAs }) };
}

function bytesOf(id: string, photo: string): string {
  return `${id} ${photo}`;
}

import { createEnvironmentInjector, EnvironmentInjector, signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { BroadcastChannel } from 'node:worker_threads';
import { letGo, newDevice, notedAhead, photoFile, refusingDevice } from '../../testing/device';
import { Session } from '../session/session';
import { DeviceStore } from './device-store';
import { Drafts } from './drafts';
import { PhotoRefused } from './photo-check';
import { UnsentHere } from './unsent-here';
import { WrittenAhead } from './written-ahead';

const person = signal<{ id: number } | undefined>({ id: 7 });

/** A window of the product on the device; two of them share what is kept and nothing else. */
const opened: EnvironmentInjector[] = [];
const stores = new WeakMap<Drafts, DeviceStore>();
async function openWindow(): Promise<Drafts> {
  const parent = TestBed.inject(EnvironmentInjector);
  const own = createEnvironmentInjector([DeviceStore, Drafts, UnsentHere, WrittenAhead], parent);
  opened.push(own);
  const drafts = own.get(Drafts);
  stores.set(drafts, own.get(DeviceStore));
  await drafts.whenRead();
  return drafts;
}

const until = async (said: () => boolean): Promise<void> => {
  for (let tries = 0; !said() && tries < 200; tries += 1) {
    await new Promise((resolve) => setTimeout(resolve, 10));
  }
  expect(said()).toBe(true);
};

describe('Drafts', () => {
  beforeAll(() => {
    globalThis.BroadcastChannel ??=
      BroadcastChannel as unknown as typeof globalThis.BroadcastChannel;
  });
  beforeEach(() => {
    newDevice();
    person.set({ id: 7 });
    TestBed.configureTestingModule({
      providers: [{ provide: Session, useValue: { person } }],
    });
  });
  afterEach(() => {
    for (const one of opened.splice(0)) one.destroy();
  });

  it('given a draft and the window closed, has it when opened anew', async () => {
    const first = await openWindow();
    const { id } = await first.begin('HAV');
    await first.change(id, { jobRef: '0417', content: { notes: 'seat out' }, step: 2 });
    const again = await openWindow();
    expect(again.find(id)).toEqual(first.find(id));
    expect(again.find(id)).toMatchObject({ jobRef: '0417', state: 'editing', step: 2 });
  });

  it('shows a change at once, before it is durable', async () => {
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    const written = drafts.change(id, { content: { notes: 'seat out' } });
    expect(drafts.list()[0]?.content.notes).toBe('seat out');
    await written;
  });

  it('shows a person their own drafts and no one else’s', async () => {
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    person.set({ id: 8 });
    await drafts.whenRead();
    expect(drafts.list()).toEqual([]);
    person.set({ id: 7 });
    await drafts.whenRead();
    expect(drafts.list().map((draft) => draft.id)).toEqual([id]);
  });

  it('given a sign-in that ended by itself, keeps showing what is being written', async () => {
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    person.set(undefined);
    await drafts.change(id, { jobRef: '0417' });
    expect(drafts.find(id)?.jobRef).toBe('0417');
  });

  it('given a page gone before changes were written, has them when opened anew', async () => {
    const first = await openWindow();
    const { id } = await first.begin('HAV', { content: { notes: 'seat out' } });
    letGo(stores.get(first)!);
    void first.change(id, { jobRef: '0417', content: { notes: 'seat out', package: 'full' } });
    void first.change(id, { content: { package: 'full' }, step: 2 });
    const again = await openWindow();
    const whole = { jobRef: '0417', content: { package: 'full' }, step: 2 };
    expect(again.find(id)).toMatchObject(whole);
    expect(again.find(id)?.content).toEqual(whole.content);
    expect((await openWindow()).find(id)).toMatchObject(whole);
    expect(notedAhead()).toEqual([]);
  });

  it('given a page gone before a change was written, and another line written since, has both', async () => {
    const first = await openWindow();
    const { id } = await first.begin('HAV', { content: { notes: 'seat out' } });
    const other = await openWindow();
    letGo(stores.get(first)!);
    void first.change(id, { content: { notes: 'seat out', package: 'full' } });
    await other.change(id, { content: { notes: 'seat out, carpet wet' } });
    const again = await openWindow();
    expect(again.find(id)?.content).toEqual({ notes: 'seat out, carpet wet', package: 'full' });
    expect(again.list()).toHaveLength(1);
  });

  it('given a page gone before a change was written, and the job removed since, has no such job', async () => {
    const first = await openWindow();
    const { id } = await first.begin('HAV');
    const other = await openWindow();
    letGo(stores.get(first)!);
    void first.change(id, { jobRef: '0417' });
    await other.remove(id);
    expect((await openWindow()).list()).toEqual([]);
    expect(notedAhead()).toEqual([]);
  });

  it('given a page gone before a change was written, shows another person nothing of it', async () => {
    const first = await openWindow();
    const { id } = await first.begin('HAV');
    letGo(stores.get(first)!);
    void first.change(id, { jobRef: '0417' });
    person.set({ id: 8 });
    expect((await openWindow()).list()).toEqual([]);
    person.set({ id: 7 });
    expect((await openWindow()).find(id)?.jobRef).toBe('0417');
  });

  it('given a job sent since as it was noted, does not open it again', async () => {
    const first = await openWindow();
    const { id } = await first.begin('HAV');
    const other = await openWindow();
    letGo(stores.get(first)!);
    void first.change(id, { jobRef: '0417' });
    await other.change(id, { jobRef: '0417' });
    await other.mark(id, () => ({
      state: 'sent',
      sentAs: '"r1"',
      sentAt: new Date().toISOString(),
    }));
    expect((await openWindow()).find(id)).toMatchObject({ state: 'sent', jobRef: '0417' });
  });

  it('leaves no note of what is written', async () => {
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    const written = Promise.all([
      drafts.change(id, { jobRef: '0417' }),
      drafts.change(id, { step: 2 }),
    ]);
    expect(notedAhead()).toHaveLength(1);
    await written;
    await until(() => notedAhead().length === 0);
  });

  it('given two windows, shows in one what was written in the other', async () => {
    const [one, other] = [await openWindow(), await openWindow()];
    const { id } = await one.begin('HAV');
    await until(() => other.find(id) !== undefined);
    await one.change(id, { jobRef: '0417' });
    await until(() => other.find(id)?.jobRef === '0417');
  });

  it('given the same line written in two windows at once, keeps both and says so', async () => {
    const one = await openWindow();
    const { id } = await one.begin('HAV', { content: { notes: 'seat out' } });
    const other = await openWindow();
    await Promise.all([
      one.change(id, { content: { notes: 'seat out, carpet wet' } }),
      other.change(id, { content: { notes: 'seat out, clips broken' } }),
    ]);
    const last = await openWindow();
    expect(
      last
        .list()
        .map(({ content }) => content.notes)
        .sort(),
    ).toEqual(['seat out, carpet wet', 'seat out, clips broken']);
    expect(one.notice() ?? other.notice()).toContain('two windows');
  });

  it('given a device that keeps nothing, says so and goes on in memory', async () => {
    refusingDevice();
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    await drafts.change(id, { jobRef: '0417' });
    const photo = await drafts.addPhoto(id, null, photoFile());
    expect(drafts.find(id)).toMatchObject({ jobRef: '0417', photos: [{ id: photo }] });
    expect((await drafts.photo(id, photo))?.size).toBe(11);
    expect(drafts.trouble()).toContain('keeps nothing on this device');
  });

  it('keeps a photo by its content, and its bytes after the window was closed', async () => {
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    const photo = await drafts.addPhoto(id, 'finding-1', photoFile());
    const again = await openWindow();
    expect(again.find(id)?.photos).toEqual([{ id: photo, finding: 'finding-1', state: 'here' }]);
    expect((await again.photo(id, photo))?.type).toBe('image/png');
    await again.removePhoto(id, photo);
    expect(await again.photo(id, photo)).toBeUndefined();
  });

  it.each([
    ['text under a photo’s name', photoFile([0x48, 0x69, 0x21]), 'no JPEG or PNG'],
    ['no byte at all', photoFile([]), 'no JPEG or PNG'],
    ['more than 10 MB', { size: 10 * 1024 * 1024 + 1 } as Blob, 'the largest'],
  ])('given %s, refuses it with a sentence', async (_what, file, sentence) => {
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    const refused = drafts.addPhoto(id, null, file);
    await expect(refused).rejects.toThrow(PhotoRefused);
    await expect(refused).rejects.toThrow(sentence);
    expect(drafts.find(id)?.photos).toEqual([]);
  });

  it('given a refused job changed, is written again; given only another step, stays refused', async () => {
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    const problem = { status: 422, sentence: 'No.', fields: [] };
    await drafts.mark(id, () => ({ state: 'refused', problem }));
    await drafts.change(id, { step: 1 });
    expect(drafts.find(id)).toMatchObject({ state: 'refused', problem });
    await drafts.change(id, { content: { package: 'full' } });
    expect(drafts.find(id)).toMatchObject({ state: 'editing', problem: undefined });
  });

  it('given a sent job changed, makes it a correction of what was sent', async () => {
    const drafts = await openWindow();
    const { id } = await drafts.begin('HAV');
    await drafts.mark(id, () => ({ state: 'sent', sentAs: '"r1"' }));
    await drafts.change(id, { content: { package: 'full' } });
    expect(drafts.find(id)).toMatchObject({ state: 'editing', corrects: '"r1"' });
  });

  it('given a job sent yesterday, takes it off the device; not while a photo of it was refused', async () => {
    const drafts = await openWindow();
    const yesterday = new Date(Date.now() - 30 * 3600_000).toISOString();
    const [over, refused] = [await drafts.begin('HAV'), await drafts.begin('HAV')];
    await drafts.mark(over.id, () => ({ state: 'sent', sentAt: yesterday }));
    await drafts.mark(refused.id, () => ({
      state: 'sent',
      sentAt: yesterday,
      photos: [{ id: 'p', finding: null, state: 'refused' }],
    }));
    const next = await openWindow();
    expect(next.list().map(({ id }) => id)).toEqual([refused.id]);
  });
});

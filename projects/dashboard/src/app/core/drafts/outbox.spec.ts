import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { JobDraft } from '#shared/contracts/under-way';
import { newDevice, photoFile } from '../../testing/device';
import { JobServer } from '../../testing/job-server';
import { Session } from '../session/session';
import { Drafts } from './drafts';
import { JobOutbox } from './outbox';
import { paceOf, RETRY_PACE } from './retry-pace';

const WHOLE: JobDraft = {
  vehicle: { make: 'Velder', model: 'Tessock', bodyType: 'hatchback', firstRegistered: '2009-05' },
  package: 'full',
  completedOn: '2026-02-02',
  actual: { stages: { strip: 60 } },
};
const PUT = 'PUT /api/branches/HAV/jobs/0417';
const GET = 'GET /api/branches/HAV/jobs/0417';

const person = signal<{ id: number } | undefined>({ id: 7 });

/** A window with the outbox in it, before a server; what is kept on the device stays between two of them. */
async function openWindow(server: JobServer) {
  TestBed.resetTestingModule();
  const token = signal<string | undefined>('one');
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([server.interceptor])),
      { provide: Session, useValue: { person, usableToken: async () => token() } },
      { provide: RETRY_PACE, useValue: () => 15 },
    ],
  });
  const drafts = TestBed.inject(Drafts);
  const outbox = TestBed.inject(JobOutbox);
  await drafts.whenRead();
  TestBed.tick();
  const until = async (said: () => boolean): Promise<void> => {
    for (let tries = 0; !said() && tries < 300; tries += 1) {
      await new Promise((resolve) => setTimeout(resolve, 10));
    }
    expect(said()).toBe(true);
  };
  const write = async (content: JobDraft = WHOLE, jobRef = '0417'): Promise<string> => {
    const { id } = await drafts.begin('HAV');
    await drafts.change(id, { jobRef, content });
    return id;
  };
  const inState = (id: string, state: string) => until(() => drafts.find(id)?.state === state);
  return { drafts, outbox, token, until, write, inState };
}
const calls = (server: JobServer) => server.heard.map(({ call }) => call);

describe('JobOutbox', () => {
  let server: JobServer;
  beforeEach(() => {
    newDevice();
    server = new JobServer();
    person.set({ id: 7 });
  });
  afterEach(() => TestBed.resetTestingModule());

  it('with a line, sends a job once and says that the server has it', async () => {
    const { drafts, outbox, write, inState } = await openWindow(server);
    const id = await write();
    await outbox.send(id);
    await inState(id, 'sent');
    expect(calls(server)).toEqual([PUT]);
    expect(server.jobs.get('HAV/0417')?.body).toEqual(WHOLE);
    expect(drafts.find(id)?.sentAs).toBe('"r1"');
    expect(outbox.state()).toMatchObject({ waiting: 0, refused: 0, line: 'up' });
  });

  it('without a line, keeps it waiting and sends it when the line is back', async () => {
    const { outbox, write, inState, until } = await openWindow(server);
    server.line = 'down';
    const id = await write();
    await outbox.send(id);
    await until(() => outbox.state().line === 'down');
    expect(outbox.state().waiting).toBe(1);
    server.line = 'up';
    await inState(id, 'sent');
    expect(calls(server)).toEqual([PUT]);
  });

  it('given the window closed while it waited, sends it from the next one', async () => {
    server.line = 'down';
    const first = await openWindow(server);
    const id = await first.write();
    await first.outbox.send(id);
    await first.until(() => first.outbox.state().line === 'down');
    server.line = 'up';
    const next = await openWindow(server);
    await next.inState(id, 'sent');
    expect(server.jobs.get('HAV/0417')?.revision).toBe(1);
  });

  it('given an answer lost on the way, does not take its own job for somebody else’s', async () => {
    const { outbox, write, inState, until } = await openWindow(server);
    server.line = 'answer lost';
    const id = await write();
    await outbox.send(id);
    await until(() => server.jobs.has('HAV/0417') && outbox.state().line === 'down');
    server.line = 'up';
    await inState(id, 'sent');
    expect(server.jobs.get('HAV/0417')?.revision).toBe(1);
    const sent = server.heard.filter(({ call }) => call === PUT).map(({ body }) => body);
    expect(new Set(sent).size).toBe(1);
    expect(calls(server).at(-1)).toBe(GET);
  });

  it('given an answer lost and the job written on, corrects what had arrived', async () => {
    const { drafts, outbox, write, inState, until } = await openWindow(server);
    server.line = 'answer lost';
    const id = await write();
    await outbox.send(id);
    await until(() => outbox.state().line === 'down' && !outbox.state().sending);
    server.line = 'down';
    await drafts.change(id, { content: { ...WHOLE, notes: 'carpet wet' } });
    server.line = 'up';
    await outbox.send(id);
    await inState(id, 'sent');
    expect(server.jobs.get('HAV/0417')).toMatchObject({
      revision: 2,
      body: { notes: 'carpet wet' },
    });
  });

  it('given an answer lost and another reference typed, does not send the car a second time', async () => {
    const { drafts, outbox, write, inState, until } = await openWindow(server);
    server.line = 'answer lost';
    const id = await write();
    await outbox.send(id);
    await until(() => outbox.state().line === 'down' && !outbox.state().sending);
    await drafts.change(id, { jobRef: '0418' });
    server.line = 'up';
    await outbox.send(id);
    await inState(id, 'refused');
    expect([...server.jobs.keys()]).toEqual(['HAV/0417']);
    expect(drafts.find(id)?.problem?.sentence).toContain('has arrived after all, as 0417');
  });

  it('given a reference that somebody else has used, is refused, naming who', async () => {
    const { drafts, outbox, write, inState } = await openWindow(server);
    server.jobs.set('HAV/0417', { revision: 1, body: { ...WHOLE, package: 'cavity' } });
    const id = await write();
    await outbox.send(id);
    await inState(id, 'refused');
    expect(drafts.find(id)?.problem).toMatchObject({ status: 412 });
    expect(drafts.find(id)?.problem?.sentence).toContain('Ilse Torven');
    expect(server.jobs.get('HAV/0417')).toMatchObject({ revision: 1, body: { package: 'cavity' } });
    expect(outbox.state()).toMatchObject({ waiting: 0, refused: 1 });
  });

  it('given a correction, sends it against the revision it was made from', async () => {
    const { drafts, outbox, write, inState } = await openWindow(server);
    server.jobs.set('HAV/0417', { revision: 3, body: WHOLE });
    const id = await write({ ...WHOLE, notes: 'one more hour' });
    await drafts.change(id, { corrects: '"r3"' });
    await outbox.send(id);
    await inState(id, 'sent');
    expect(server.jobs.get('HAV/0417')?.revision).toBe(4);
  });

  it('given input that the server refuses, tells its problem and tries no more', async () => {
    const { drafts, outbox, write, inState } = await openWindow(server);
    const problems = [{ path: '/package', message: 'no package has the code "full"' }];
    server.line = { status: 422, body: { problems } };
    const id = await write();
    await outbox.send(id);
    await inState(id, 'refused');
    await new Promise((resolve) => setTimeout(resolve, 80));
    expect(drafts.find(id)?.problem?.fields).toEqual(problems);
    expect(calls(server)).toEqual([PUT]);
  });

  it.each([500, 503, 408, 425, 429])(
    'answered with %d, keeps it waiting and tries again',
    async (status) => {
      const { outbox, write, inState, until } = await openWindow(server);
      server.line = { status };
      const id = await write();
      await outbox.send(id);
      await until(() => calls(server).length > 1);
      expect(outbox.state().refused).toBe(0);
      server.line = 'up';
      await inState(id, 'sent');
      expect(server.jobs.get('HAV/0417')?.revision).toBe(1);
    },
  );

  it('with nobody signed in any more, waits and says so; signed in again, sends', async () => {
    const { outbox, token, write, inState, until } = await openWindow(server);
    token.set(undefined);
    const id = await write();
    person.set(undefined);
    await outbox.send(id);
    await until(() => outbox.state().signedOut && !outbox.state().sending);
    expect(outbox.state().waiting).toBe(1);
    expect(calls(server)).toEqual([]);
    token.set('two');
    person.set({ id: 7 });
    await inState(id, 'sent');
  });

  it('given something still missing, says what and sends nothing', async () => {
    const { drafts, outbox, write } = await openWindow(server);
    const id = await write({ ...WHOLE, package: undefined }, '');
    await expect(outbox.send(id)).rejects.toMatchObject({
      status: 422,
      fields: [{ path: '/jobRef' }, { path: '/package' }],
    });
    expect(drafts.find(id)?.state).toBe('editing');
  });

  it('after the job sends its photos, each once, and frees their room', async () => {
    const { drafts, outbox, write, until } = await openWindow(server);
    const id = await write();
    const photos = [
      await drafts.addPhoto(id, 'finding-1', photoFile()),
      await drafts.addPhoto(id, null, photoFile()),
    ];
    await outbox.send(id);
    await until(() => drafts.find(id)?.photos.every(({ state }) => state === 'sent') === true);
    await until(() => !outbox.state().sending);
    expect([...server.photos.keys()]).toEqual(photos);
    expect(calls(server)).toEqual([PUT, ...photos.map((photo) => `${PUT}/photos/${photo}`)]);
    expect(await drafts.photo(id, photos[0]!)).toBeUndefined();
    expect(outbox.state().photosWaiting).toBe(0);
  });
});

describe('paceOf', () => {
  it.each([
    [1, 0.5, 2_000],
    [3, 0.5, 8_000],
    [3, 0, 6_000],
    [3, 1, 10_000],
    [1, 0, 2_000],
    [20, 1, 120_000],
  ])('after %d tries and chance %d, waits %d ms', (tries, chance, wait) => {
    expect(paceOf(() => chance)(tries)).toBe(wait);
  });
});

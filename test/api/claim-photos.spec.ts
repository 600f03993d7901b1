import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import sharp from 'sharp';
import { MOST_PHOTOS } from '#shared/contracts/photos';
import { sql } from '#db/database';
import { TestApp, type Answer } from '../support/app';
import { bytesOf, jpegOf, picture, sendPhoto } from '../support/send-photo';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
let blue: Buffer;
let red: Buffer;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  [blue, red] = await Promise.all([jpegOf(), jpegOf(64, 48, '#802020')]);
});
afterAll(() => app.stop());

let next = 0;
/** A claim of the branch on a job of its own, and where its photos are. */
async function claimWithPhotos(): Promise<{ at: string; job: string }> {
  const ref = `shown-${(next += 1)}`;
  const job = `/api/branches/AAA/jobs/${ref}`;
  await app.call('put', job, { token: network.manager, body: validJob() });
  const claim = `/api/branches/AAA/claims/${ref}`;
  const body = {
    ...{ jobRef: ref, madeOn: '2026-01-30', zone: 'floor', side: 'left' },
    ...{ cause: 'damage', decision: 'open' },
  };
  await app.call('put', claim, { token: network.recorder, body });
  return { at: `${claim}/photos`, job };
}
const send = (address: string, bytes: Buffer, token = network.recorder): Promise<Answer> =>
  sendPhoto(app, address, bytes, { token });
const list = async (at: string, token = network.recorder): Promise<Record<string, unknown>[]> =>
  (await app.call('get', at, { token })).body.items;
const filesOfBranch = (): string[] => readdirSync(join(app.folder, 'photos', 'AAA'));
const lastEvent = (): Record<string, string> =>
  app.kit.store.unscoped.first(sql('audit_events').orderBy('id', 'desc').limit(1))!;

describe('PUT …/claims/:claimRef/photos/:photo', () => {
  it('given a photo with a place and a device in it, keeps the picture alone and says who sent it', async () => {
    const { at } = await claimWithPhotos();
    const sent = await picture()
      .withExif({ IFD0: { Make: 'Devicemaker' }, IFD3: { GPSLatitudeRef: 'N' } })
      .jpeg()
      .toBuffer();
    const made = await send(`${at}/one`, sent);
    expect([made.status, made.body]).toEqual([
      201,
      {
        photo: 'one',
        width: 64,
        height: 48,
        bytes: expect.any(Number),
        receivedAt: expect.stringMatching(/^20\d\d-\d\d-\d\dT/),
        by: 'recorder@network.example',
      },
    ]);
    expect(await list(at)).toEqual([made.body]);
    for (const size of ['whole', 'small']) {
      const shown = await bytesOf(app, `${at}/one?size=${size}`, network.lead);
      expect([shown.status, shown.type]).toEqual([200, 'image/jpeg']);
      expect((await sharp(shown.bytes).metadata()).exif).toBeUndefined();
      expect(shown.bytes.includes('Devicemaker')).toBe(false);
    }
  });

  it('given the same again, changes nothing; given another, replaces it and tells the trail', async () => {
    const { at } = await claimWithPhotos();
    const first = await send(`${at}/one`, blue, network.keys['AAA']);
    const files = filesOfBranch();
    const again = await send(`${at}/one`, blue);
    expect([again.status, again.body]).toEqual([200, first.body]);
    expect(filesOfBranch()).toEqual(files);
    expect((await send(`${at}/one`, red, network.manager)).status).toBe(200);
    expect(filesOfBranch()).toHaveLength(files.length);
    expect(lastEvent()).toMatchObject({
      action: 'photo.replace',
      subject: at.replace('/api', '') + '/one',
      actor: 'manager@network.example',
    });
    expect(Object.keys(JSON.parse(lastEvent()['detail']!).before)).toEqual([
      ...['sentHash', 'receivedAt'],
    ]);
  });

  it('given a text named as a photo, refuses it and keeps nothing', async () => {
    const { at } = await claimWithPhotos();
    expect((await send(`${at}/no`, Buffer.from('not a picture'))).status).toBe(422);
    expect(await list(at)).toEqual([]);
  });

  it('given a claim with as many as there can be, refuses one more', async () => {
    const { at } = await claimWithPhotos();
    await send(`${at}/one`, blue);
    await app.kit.store.queue.write(() => {
      const { unscoped } = app.kit.store;
      const row = unscoped.first<object>(sql('claim_photos').orderBy('id', 'desc').limit(1))!;
      for (let n = 1; n < MOST_PHOTOS; n += 1) {
        unscoped.run(sql('claim_photos').insert({ ...row, id: null, photo_ref: `many-${n}` }));
      }
    });
    const refused = await send(`${at}/more`, red);
    expect([refused.status, refused.body.problems[0].message]).toEqual([
      422,
      expect.stringContaining('the claim has 200 photos'),
    ]);
    expect((await send(`${at}/one`, blue)).status).toBe(200);
  });
});

describe('Photos of a claim and of a job of one reference', () => {
  it('given both, are kept apart', async () => {
    const { at, job } = await claimWithPhotos();
    await send(`${at}/one`, blue);
    expect(await list(`${job}/photos`)).toEqual([]);
    await send(`${job}/photos/one`, red);
    await app.call('delete', `${job}/photos/one`, { token: network.manager });
    expect(await list(at)).toHaveLength(1);
    expect((await bytesOf(app, `${at}/one`, network.recorder)).status).toBe(200);
  });

  it('given a claim that is not there or whose job is void, are absent with it (rule 59)', async () => {
    const { at, job } = await claimWithPhotos();
    await send(`${at}/one`, blue);
    expect((await send('/api/branches/AAA/claims/never/photos/one', blue)).status).toBe(404);
    await app.call('delete', job, { token: network.manager });
    for (const address of [at, `${at}/one`]) {
      expect((await app.call('get', address, { token: network.manager })).status).toBe(404);
    }
    expect((await send(`${at}/two`, blue)).status).toBe(404);
    await app.call('post', `${job}/restore`, { token: network.manager });
    expect((await list(at)).map(({ photo }) => photo)).toEqual(['one']);
  });
});

describe('DELETE …/claims/:claimRef/photos/:photo', () => {
  it('given a photo, takes it off with its bytes and tells the trail', async () => {
    const { at } = await claimWithPhotos();
    await send(`${at}/one`, blue);
    const files = filesOfBranch();
    expect((await app.call('delete', `${at}/one`, { token: network.keys['AAA'] })).status).toBe(
      403,
    );
    expect((await app.call('delete', `${at}/one`, { token: network.recorder })).status).toBe(204);
    expect(filesOfBranch()).toHaveLength(files.length - 2);
    expect(lastEvent()).toMatchObject({
      action: 'photo.remove',
      actor: 'recorder@network.example',
    });
    for (const method of ['delete', 'get']) {
      expect((await app.call(method, `${at}/one`, { token: network.recorder })).status).toBe(404);
    }
  });

  it('given a lead, shows them and takes none; given another branch, has nothing', async () => {
    const { at } = await claimWithPhotos();
    await send(`${at}/one`, blue);
    expect(await list(at, network.lead)).toHaveLength(1);
    expect((await send(`${at}/two`, blue, network.lead)).status).toBe(403);
    const elsewhere = at.replace('AAA', 'CCC');
    for (const address of [elsewhere, `${elsewhere}/one`]) {
      expect((await app.call('get', address, { token: network.lead })).status).toBe(404);
    }
    expect((await send(`${at}/one`, blue, network.keys['BBB'])).status).toBe(404);
  });
});

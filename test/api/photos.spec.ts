import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import sharp from 'sharp';
import { LARGEST_PHOTO, MOST_PHOTOS } from '#shared/contracts/photos';
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
/** A job of the branch, and where its photos are. */
async function jobWithPhotos(): Promise<string> {
  const at = `/api/branches/AAA/jobs/photo-${(next += 1)}`;
  await app.call('put', at, { token: network.recorder, body: validJob({ invoice: null }) });
  return `${at}/photos`;
}
const send = (address: string, bytes: Buffer, token = network.recorder): Promise<Answer> =>
  sendPhoto(app, address, bytes, { token });
const list = async (at: string, token = network.recorder): Promise<Record<string, unknown>[]> =>
  (await app.call('get', at, { token })).body.items;
const filesOfBranch = (): string[] => readdirSync(join(app.folder, 'photos', 'AAA'));
const lastEvent = (): { action: string; subject: string; actor: string } =>
  app.kit.store.unscoped.first(sql('audit_events').orderBy('id', 'desc').limit(1))!;

describe('PUT …/photos/:photo', () => {
  it('given a JPEG or a PNG, keeps it and says who sent it when', async () => {
    const at = await jobWithPhotos();
    const made = await send(`${at}/left?finding=sill_inner%2Fleft%2F1`, blue);
    expect([made.status, made.body]).toEqual([
      201,
      {
        photo: 'left',
        finding: 'sill_inner/left/1',
        width: 64,
        height: 48,
        bytes: expect.any(Number),
        receivedAt: expect.stringMatching(/^20\d\d-\d\d-\d\dT/),
        by: 'recorder@network.example',
      },
    ]);
    const png = await picture().png().toBuffer();
    const type = 'image/png';
    expect(
      (await sendPhoto(app, `${at}/png`, png, { token: network.keys['AAA'], type })).body,
    ).toMatchObject({ photo: 'png', finding: null, by: 'push key "test system"' });
    expect((await list(at)).map(({ photo }) => photo)).toEqual(['left', 'png']);
  });

  it('given a place and a device in it, gives back a picture without them', async () => {
    const at = await jobWithPhotos();
    const gps = { GPSLatitudeRef: 'N', GPSLatitude: '52/1 31/1 12/1' };
    const sent = await picture()
      .withExif({ IFD0: { Make: 'Devicemaker' }, IFD3: gps })
      .jpeg()
      .toBuffer();
    expect((await sharp(sent).metadata()).exif?.includes('Devicemaker')).toBe(true);
    await send(`${at}/there`, sent);
    for (const size of ['whole', 'small']) {
      const { status, type, bytes } = await bytesOf(
        app,
        `${at}/there?size=${size}`,
        network.recorder,
      );
      expect([status, type]).toEqual([200, 'image/jpeg']);
      expect(await sharp(bytes).metadata()).toMatchObject({ format: 'jpeg', width: 64 });
      expect((await sharp(bytes).metadata()).exif).toBeUndefined();
      expect(bytes.includes('Devicemaker')).toBe(false);
    }
    expect(filesOfBranch().length % 2).toBe(0);
  });

  it('given the same again, changes nothing; given other bytes, replaces it and tells the trail', async () => {
    const at = await jobWithPhotos();
    const first = await send(`${at}/one`, blue);
    const files = filesOfBranch();
    const again = await send(`${at}/one`, blue, network.manager);
    expect([again.status, again.body]).toEqual([200, first.body]);
    expect(filesOfBranch()).toEqual(files);
    const other = await send(`${at}/one`, red, network.manager);
    expect([other.status, other.body.by]).toEqual([200, 'manager@network.example']);
    expect(await list(at)).toHaveLength(1);
    // What it replaced is gone from the store.
    expect(filesOfBranch()).toHaveLength(files.length);
    const { bytes } = await bytesOf(app, `${at}/one`, network.recorder);
    expect((await sharp(bytes).stats()).dominant.r).toBeGreaterThan(100);
    expect(lastEvent()).toMatchObject({
      action: 'photo.replace',
      actor: 'manager@network.example',
    });
  });

  it('given the same photo for another finding, moves it there', async () => {
    const at = await jobWithPhotos();
    await send(`${at}/one?finding=a`, blue);
    const moved = await send(`${at}/one?finding=b`, blue);
    expect([moved.status, moved.body.finding]).toEqual([200, 'b']);
    expect((await bytesOf(app, `${at}/one`, network.recorder)).status).toBe(200);
  });

  it('given two equal ones at once, keeps one (rule 68)', async () => {
    const at = await jobWithPhotos();
    const files = filesOfBranch().length;
    const answers = await Promise.all([1, 2, 3].map(() => send(`${at}/twin`, blue)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 200, 201]);
    expect(await list(at)).toHaveLength(1);
    expect(filesOfBranch()).toHaveLength(files + 2);
  });

  it('given two different ones under one reference at once, keeps one of them whole', async () => {
    const at = await jobWithPhotos();
    const files = filesOfBranch().length;
    const answers = await Promise.all([blue, red].map((bytes) => send(`${at}/race`, bytes)));
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 201]);
    expect((await bytesOf(app, `${at}/race`, network.recorder)).status).toBe(200);
    expect(filesOfBranch()).toHaveLength(files + 2);
  });

  it.each<[what: string, make: () => Promise<Buffer>]>([
    ['a text named as a photo', async () => Buffer.from('not a picture')],
    ['a GIF', () => picture().gif().toBuffer()],
    ['a JPEG cut short', async () => (await jpegOf(400, 300)).subarray(0, 900)],
  ])('given %s, refuses it in words and keeps nothing', async (_what, make) => {
    const at = await jobWithPhotos();
    const files = filesOfBranch();
    const answer = await send(`${at}/no`, await make());
    expect(answer.status).toBe(422);
    expect(answer.body.problems).toEqual([
      { path: '', message: expect.stringMatching(/^the photo /) },
    ]);
    expect(await list(at)).toEqual([]);
    expect(filesOfBranch()).toEqual(files);
  });

  it('given a byte more than 10 MB, answers 413; given 10 MB, reads it', async () => {
    const at = await jobWithPhotos();
    const large = Buffer.alloc(LARGEST_PHOTO + 1, 0xff);
    expect((await send(`${at}/large`, large)).status).toBe(413);
    blue.copy(large);
    // What follows a picture is not looked at, and not kept.
    const taken = await send(`${at}/large`, large.subarray(0, LARGEST_PHOTO));
    expect([taken.status, taken.body.bytes < 10_000]).toEqual([201, true]);
  });

  it('given no bytes or another type, answers 400 or 415', async () => {
    const at = await jobWithPhotos();
    expect((await send(`${at}/none`, Buffer.alloc(0))).status).toBe(400);
    for (const type of ['image/gif', 'application/octet-stream', 'image/svg+xml']) {
      const answer = await sendPhoto(app, `${at}/none`, blue, { token: network.recorder, type });
      expect([type, answer.status]).toEqual([type, 415]);
    }
  });

  it('given a job that is not there, is void, or of another branch, answers 404', async () => {
    const at = await jobWithPhotos();
    await send(`${at}/one`, blue);
    expect((await send('/api/branches/AAA/jobs/never/photos/one', blue)).status).toBe(404);
    const job = at.replace('/photos', '');
    expect((await app.call('delete', job, { token: network.manager })).status).toBe(204);
    for (const address of [`${at}/one`, at, `${at}/one?size=small`]) {
      expect((await app.call('get', address, { token: network.manager })).status).toBe(404);
    }
    expect((await send(`${at}/two`, blue)).status).toBe(404);
    // With the job its photos come back.
    await app.call('put', job, { token: network.manager, body: validJob({ notes: 'back' }) });
    expect((await list(at)).map(({ photo }) => photo)).toEqual(['one']);
  });

  it('given a job with as many as there can be, refuses one more and still takes a known one', async () => {
    const at = await jobWithPhotos();
    await send(`${at}/one`, blue);
    await app.kit.store.queue.write(() => {
      const { unscoped } = app.kit.store;
      const row = unscoped.first<Record<string, unknown>>(
        sql('photos').orderBy('id', 'desc').limit(1),
      )!;
      for (let n = 1; n < MOST_PHOTOS; n += 1) {
        unscoped.run(sql('photos').insert({ ...row, id: null, photo_ref: `many-${n}` }));
      }
    });
    const refused = await send(`${at}/more`, red);
    expect([refused.status, refused.body.problems[0].message]).toEqual([
      422,
      expect.stringContaining('200 photos'),
    ]);
    expect((await send(`${at}/one`, blue)).status).toBe(200);
  });
});

describe('DELETE …/photos/:photo', () => {
  it('given a photo, takes it off with its bytes, tells the trail, and answers 404 from then on', async () => {
    const at = await jobWithPhotos();
    await send(`${at}/one`, blue);
    const files = filesOfBranch();
    const gone = await app.call('delete', `${at}/one`, { token: network.recorder });
    expect([gone.status, gone.text]).toEqual([204, '']);
    expect(filesOfBranch()).toHaveLength(files.length - 2);
    expect(lastEvent()).toMatchObject({
      action: 'photo.remove',
      subject: expect.stringMatching(/^\/branches\/AAA\/jobs\/photo-\d+\/photos\/one$/),
      actor: 'recorder@network.example',
    });
    for (const method of ['delete', 'get']) {
      expect((await app.call(method, `${at}/one`, { token: network.recorder })).status).toBe(404);
    }
  });

  it('given a push key, answers 403', async () => {
    const at = await jobWithPhotos();
    const answer = await app.call('delete', `${at}/one`, { token: network.keys['AAA'] });
    expect(answer.status).toBe(403);
  });
});

describe('Photos and who may see them', () => {
  it('given a lead, shows them and takes none; given another branch, has nothing', async () => {
    const at = await jobWithPhotos();
    await send(`${at}/one`, blue);
    expect(await list(at, network.lead)).toHaveLength(1);
    expect((await bytesOf(app, `${at}/one`, network.lead)).status).toBe(200);
    expect((await send(`${at}/two`, blue, network.lead)).status).toBe(403);
    const elsewhere = at.replace('AAA', 'CCC');
    for (const address of [elsewhere, `${elsewhere}/one`]) {
      expect((await app.call('get', address, { token: network.lead })).status).toBe(404);
    }
    expect((await send(`${elsewhere}/one`, blue)).status).toBe(404);
    expect((await send(`${at}/one`, blue, network.keys['BBB'])).status).toBe(404);
  });
});

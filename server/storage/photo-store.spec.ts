import { existsSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { startBucketServer, type BucketServer } from '../../test/support/bucket-server';
import { readConfig } from '../config';
import { BucketPhotoStore } from './bucket-photo-store';
import { FolderPhotoStore } from './folder-photo-store';
import { photoStoreOf, type PhotoStore } from './photo-store';

let folder = '';
let server: BucketServer;
const stores: Record<string, PhotoStore> = {};

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'photo-store-'));
  server = await startBucketServer();
  const at = { UNDERSEAM_DATA: folder };
  stores['folder'] = photoStoreOf(readConfig(at));
  stores['bucket'] = photoStoreOf(readConfig({ ...at, ...server.environment }));
});
afterAll(async () => {
  await (stores['bucket'] as BucketPhotoStore).close();
  await server.close();
  rmSync(folder, { recursive: true, force: true });
});

const ONE = Buffer.from([0xff, 0xd8, 0, 1, 2, 0xff, 0xd9]);
const OTHER = Buffer.alloc(300_000, 7);

describe.each(['folder', 'bucket'])('A photo store that is a %s', (kind) => {
  const store = (): PhotoStore => stores[kind] as PhotoStore;

  it('given bytes under a key, gives back the same bytes', async () => {
    await store().put('AAA/one.jpg', ONE);
    await store().put('AAA/one-small.jpg', OTHER);
    expect((await store().get('AAA/one.jpg'))?.equals(ONE)).toBe(true);
    expect((await store().get('AAA/one-small.jpg'))?.equals(OTHER)).toBe(true);
  });

  it('given a key that holds something, replaces it', async () => {
    await store().put('AAA/again.jpg', OTHER);
    await store().put('AAA/again.jpg', ONE);
    expect((await store().get('AAA/again.jpg'))?.equals(ONE)).toBe(true);
  });

  it('given a key twice at once, keeps one of the two whole', async () => {
    const both = [ONE, OTHER];
    await Promise.all(both.map((bytes) => store().put('BBB/at-once.jpg', bytes)));
    const kept = await store().get('BBB/at-once.jpg');
    expect(both.some((bytes) => kept?.equals(bytes))).toBe(true);
  });

  it('given a key that holds nothing, says so', async () => {
    expect(await store().get('AAA/never.jpg')).toBeUndefined();
    expect(await store().get('NEVER/one.jpg')).toBeUndefined();
  });

  it('given a removal, holds it no more, and another removal changes nothing', async () => {
    await store().put('AAA/gone.jpg', ONE);
    await store().remove('AAA/gone.jpg');
    expect(await store().get('AAA/gone.jpg')).toBeUndefined();
    await expect(store().remove('AAA/gone.jpg')).resolves.toBeUndefined();
  });
});

describe('FolderPhotoStore', () => {
  it('given what it was put, keeps it below photos and leaves nothing unfinished', async () => {
    const data = join(folder, 'apart');
    await new FolderPhotoStore(data).put('AAA/one.jpg', ONE);
    expect(readdirSync(join(data, 'photos', 'AAA'))).toEqual(['one.jpg']);
  });

  it('given a place that cannot be written, says so and leaves nothing', async () => {
    writeFileSync(join(folder, 'file'), '');
    await expect(
      new FolderPhotoStore(join(folder, 'file')).put('AAA/one.jpg', ONE),
    ).rejects.toThrow();
    expect(existsSync(join(folder, 'file', 'photos'))).toBe(false);
  });
});

describe('BucketPhotoStore', () => {
  it('given a bucket that is not there, fails rather than say that there is no photo', async () => {
    const { bucket } = readConfig({ ...server.environment, UNDERSEAM_S3_BUCKET: 'elsewhere' });
    const store = new BucketPhotoStore(bucket!);
    await expect(store.get('AAA/one.jpg')).rejects.toThrow();
    await expect(store.put('AAA/one.jpg', ONE)).rejects.toThrow();
    await store.close();
  });
});

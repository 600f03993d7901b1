import { PhotoWriter } from '#db/photo-writer';
import { RECEIPT, SmallStore } from '../../../test/support/small-store';
import { putPhoto, type PhotoBench } from './put-photo';

let small: SmallStore;
beforeEach(async () => {
  small = await SmallStore.make();
  await small.putJob('AAA', 'j');
});
afterEach(() => small.close());

const SENT = {
  place: { of: 'job', ref: 'j' } as const,
  photo: 'p',
  finding: null,
  bytes: Buffer.from('sent'),
};
const DEED = { actor: RECEIPT.actor, at: RECEIPT.receivedAt, subject: '/photos/p' };

/** A bench whose bytes lie in a set of keys, and which may be stopped at a step. */
function benchOf(kept: Set<string>, change: Partial<PhotoBench> = {}): PhotoBench {
  let named = 0;
  return {
    writer: new PhotoWriter(small.store, small.branch('AAA')),
    write: (work) => small.store.queue.write(work),
    remake: async (bytes) => ({ whole: bytes, small: bytes, width: 1, height: 1 }),
    keepBytes: async (key) => void kept.add(key),
    dropBytes: async (key) => void kept.delete(key),
    newName: () => `n${kept.size}-${(named += 1)}`,
    ...change,
  };
}

describe('putPhoto', () => {
  it('given a stop while bytes are kept, has no row of them yet', async () => {
    const kept = new Set<string>();
    const rows: number[] = [];
    const keepBytes = async (key: string): Promise<void> => {
      rows.push(small.count('photos'));
      kept.add(key);
    };
    await putPhoto(benchOf(kept, { keepBytes }), SENT, DEED);
    expect(rows).toEqual([0]);
    expect(small.count('photos')).toBe(1);
  });

  it('given bytes that cannot be kept, or a row that cannot be written, leaves neither', async () => {
    const kept = new Set<string>();
    const full = (): never => {
      throw new Error('the disk is full');
    };
    await expect(putPhoto(benchOf(kept, { keepBytes: full }), SENT, DEED)).rejects.toThrow('full');
    let writes = 0;
    const write: PhotoBench['write'] = (work) => {
      writes += 1;
      return small.store.queue.write(() => (writes === 1 ? work() : full()));
    };
    await expect(putPhoto(benchOf(kept, { write }), SENT, DEED)).rejects.toThrow('full');
    expect([kept.size, small.count('photos')]).toEqual([0, 0]);
  });

  it('given a job voided while the photo was made anew, keeps nothing of it', async () => {
    const kept = new Set<string>();
    const remake: PhotoBench['remake'] = async (bytes) => {
      await small.voidJob('AAA', 'j');
      return { whole: bytes, small: bytes, width: 1, height: 1 };
    };
    await expect(putPhoto(benchOf(kept, { remake }), SENT, DEED)).rejects.toMatchObject({
      kind: 'not-found',
    });
    expect([kept.size, small.count('photos')]).toEqual([0, 0]);
  });

  it('given the same photo once more, makes nothing anew', async () => {
    const kept = new Set<string>();
    await putPhoto(benchOf(kept), SENT, DEED);
    const remake = jest.fn<ReturnType<PhotoBench['remake']>, [Buffer]>();
    const again = await putPhoto(benchOf(kept, { remake }), SENT, DEED);
    expect([again.status, remake.mock.calls.length, kept.size]).toEqual(['unchanged', 0, 1]);
  });
});

import sharp from 'sharp';
import { Refusal } from '#shared/domain/refusal';
import { jpegOf, picture } from '../../../test/support/send-photo';
import { isMovingPng, kindOf } from './photo-kind';
import { LONGEST_EDGE, LONGEST_EDGE_SMALL, remakePhoto } from './remake-photo';

async function refusalOf(bytes: Buffer): Promise<string> {
  try {
    await remakePhoto(bytes);
  } catch (error) {
    if (error instanceof Refusal) return error.problems.map(({ message }) => message).join();
    throw error;
  }
  return 'taken';
}

/** A PNG with a chunk set before its data, with a checksum of nothing, which a reader of names does not ask for. */
async function pngWith(name: string): Promise<Buffer> {
  const png = await picture().png().toBuffer();
  const chunk = Buffer.alloc(12 + 8);
  chunk.writeUInt32BE(8, 0);
  chunk.write(name, 4, 'latin1');
  const afterHeader = 8 + 25;
  return Buffer.concat([png.subarray(0, afterHeader), chunk, png.subarray(afterHeader)]);
}

describe('kindOf', () => {
  it('given first bytes, goes by them alone', async () => {
    expect(kindOf(await jpegOf())).toBe('jpeg');
    expect(kindOf(await picture().png().toBuffer())).toBe('png');
    expect(kindOf(await picture().webp().toBuffer())).toBeUndefined();
    expect(kindOf(Buffer.from('GIF89a'))).toBeUndefined();
    expect(kindOf(Buffer.from([0xff, 0xd8]))).toBeUndefined();
    expect(kindOf(Buffer.alloc(0))).toBeUndefined();
  });
});

describe('isMovingPng', () => {
  it('given a chunk that announces frames, says so, and of any other not', async () => {
    expect(isMovingPng(await pngWith('acTL'))).toBe(true);
    expect(isMovingPng(await pngWith('tEXt'))).toBe(false);
    expect(isMovingPng(await picture().png().toBuffer())).toBe(false);
    expect(isMovingPng(Buffer.alloc(8))).toBe(false);
  });
});

describe('remakePhoto', () => {
  it('given a place and a device written beside the picture, keeps nothing of them', async () => {
    const sent = await picture()
      .withExif({
        IFD0: { Make: 'Devicemaker', Model: 'Device 9', DateTime: '2026:01:28 10:00:00' },
        IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '52/1 31/1 12/1' },
      })
      .withXmp('<x:xmpmeta xmlns:x="adobe:ns:meta/"/>')
      .withIccProfile('p3')
      .jpeg()
      .toBuffer();
    expect(sent.includes('Devicemaker')).toBe(true);
    const { whole, small } = await remakePhoto(sent);
    for (const bytes of [whole, small]) {
      const { format, exif, icc, xmp, iptc, space } = await sharp(bytes).metadata();
      expect([format, space]).toEqual(['jpeg', 'srgb']);
      expect([exif, icc, xmp, iptc]).toEqual(Array(4).fill(undefined));
      expect(bytes.includes('Devicemaker') || bytes.includes('Exif')).toBe(false);
    }
  });

  it('given a picture that lies on its side, stands it up', async () => {
    const sent = await picture(64, 48).withMetadata({ orientation: 6 }).jpeg().toBuffer();
    const { whole, width, height } = await remakePhoto(sent);
    expect([width, height]).toEqual([48, 64]);
    // Turned by a quarter to the right: what was upper left is upper right.
    const pixels = await sharp(whole).raw().toBuffer();
    const at = (x: number, y: number): number => pixels[(y * 48 + x) * 3] as number;
    expect(at(44, 3)).toBeGreaterThan(200);
    expect(at(3, 3)).toBeLessThan(100);
  });

  it('given a large picture, caps the longest edge of both sizes', async () => {
    const { whole, small, width, height } = await remakePhoto(await jpegOf(4000, 3000));
    expect([width, height]).toEqual([LONGEST_EDGE, 1920]);
    expect(await sharp(whole).metadata()).toMatchObject({ width: LONGEST_EDGE, height: 1920 });
    expect(await sharp(small).metadata()).toMatchObject({ width: LONGEST_EDGE_SMALL, height: 360 });
  });

  it('given a small one, does not blow it up', async () => {
    const { whole, small } = await remakePhoto(await jpegOf(20, 10));
    for (const bytes of [whole, small]) {
      expect(await sharp(bytes).metadata()).toMatchObject({ width: 20, height: 10 });
    }
  });

  it('given a PNG one can see through, puts white behind it', async () => {
    const clear = { r: 0, g: 0, b: 0, alpha: 0 };
    const sent = await sharp({ create: { width: 8, height: 8, channels: 4, background: clear } })
      .png()
      .toBuffer();
    const pixels = await sharp((await remakePhoto(sent)).whole)
      .raw()
      .toBuffer();
    expect(pixels[0]).toBeGreaterThan(250);
  });

  it('given something hidden behind the picture, does not carry it over', async () => {
    const sent = Buffer.concat([await jpegOf(), Buffer.from('PK\u0003\u0004<script>hidden')]);
    expect((await remakePhoto(sent)).whole.includes('hidden')).toBe(false);
  });

  it.each<[what: string, make: () => Promise<Buffer>, message: RegExp]>([
    ['a text', async () => Buffer.from('not a picture at all'), /neither a JPEG nor a PNG/],
    [
      'a drawing in markup',
      async () => Buffer.from('<svg xmlns="http://www.w3.org/2000/svg"/>'),
      /neither a JPEG nor a PNG/,
    ],
    ['a GIF', () => picture().gif().toBuffer(), /neither a JPEG nor a PNG/],
    ['a WebP', () => picture().webp().toBuffer(), /neither a JPEG nor a PNG/],
    ['a moving PNG', () => pngWith('acTL'), /moves/],
    [
      'the first bytes of a JPEG before a GIF',
      async () =>
        Buffer.concat([Buffer.from([0xff, 0xd8, 0xff]), await picture().gif().toBuffer()]),
      /damaged/,
    ],
    ['a JPEG cut short', async () => (await jpegOf(400, 300)).subarray(0, 900), /cut short/],
    ['a JPEG without its end', async () => (await jpegOf()).subarray(0, -2), /cut short/],
    [
      'a PNG cut short',
      async () => (await picture().png().toBuffer()).subarray(0, 90),
      /cut short/,
    ],
    [
      'more pixels than any phone',
      () =>
        sharp({ create: { width: 9000, height: 9000, channels: 3, background: 'red' } })
          .png({ compressionLevel: 1 })
          .toBuffer(),
      /more than 64 million pixels/,
    ],
  ])('given %s, refuses it in words', async (_what, make, message) => {
    expect(await refusalOf(await make())).toMatch(message);
  });
});

import { LARGEST_PHOTO } from '#shared/contracts/photos';

/** A file that cannot be kept as a photo, with a sentence for the person who chose it. */
export class PhotoRefused extends Error {}

const KINDS: readonly { readonly type: string; readonly begins: readonly number[] }[] = [
  // JPEG: start of image and the next marker (ISO/IEC 10918-1, B.1.1.3).
  { type: 'image/jpeg', begins: [0xff, 0xd8, 0xff] },
  // PNG: its eight-byte signature (ISO/IEC 15948, 5.2).
  { type: 'image/png', begins: [0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a] },
];

/** Reads a photo and tells by its content what it is, whatever its name says. Throws `PhotoRefused`. */
export async function readPhoto(file: Blob): Promise<{ bytes: ArrayBuffer; type: string }> {
  if (file.size > LARGEST_PHOTO) {
    throw new PhotoRefused(
      `This photo has ${Math.ceil(file.size / 1024 / 1024)} MB; the largest that can be sent is 10 MB. Take it again with fewer pixels.`,
    );
  }
  const bytes = await file.arrayBuffer().catch(() => undefined);
  if (!bytes) throw new PhotoRefused('This photo could not be read. Take or choose it again.');
  const head = new Uint8Array(bytes, 0, Math.min(8, bytes.byteLength));
  const kind = KINDS.find(({ begins }) => begins.every((byte, index) => head[index] === byte));
  if (!kind) {
    throw new PhotoRefused(
      'This file is no JPEG or PNG photo. Choose another, or set the camera to JPEG.',
    );
  }
  return { bytes, type: kind.type };
}

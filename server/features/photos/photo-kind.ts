/** First bytes: JPEG by ITU-T T.81 (SOI and the next marker), PNG by ISO/IEC 15948 (its signature). */
const JPEG = Buffer.from([0xff, 0xd8, 0xff]);
const PNG = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);

/** What a file is by its first bytes. */
export function kindOf(bytes: Buffer): 'jpeg' | 'png' | undefined {
  if (bytes.subarray(0, JPEG.length).equals(JPEG)) return 'jpeg';
  if (bytes.subarray(0, PNG.length).equals(PNG)) return 'png';
  return undefined;
}

/** Whether a PNG is animated: it then has a chunk `acTL` before its first data (PNG, third edition, 11.3.6). */
export function isMovingPng(bytes: Buffer): boolean {
  // A chunk: length, name, data, checksum.
  for (let at = PNG.length; at + 8 <= bytes.length;) {
    const name = bytes.toString('latin1', at + 4, at + 8);
    if (name === 'acTL') return true;
    if (name === 'IDAT' || name === 'IEND') return false;
    at += 12 + bytes.readUInt32BE(at);
  }
  return false;
}

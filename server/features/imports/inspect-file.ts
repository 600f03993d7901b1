import { isUtf8 } from 'node:buffer';
import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { refuseInput } from '#shared/domain/refusal';

/** What is known of a file before a row of it is read. */
export interface InspectedFile {
  /** Its beginning, from which the way to read it is guessed. */
  head: Buffer;
  /** Whether `head` is all of it. */
  whole: boolean;
  sha256: string;
  encoding: 'utf-8' | 'windows-1252';
}

const HEAD = 64 * 1024;
const BOM = Buffer.from([0xef, 0xbb, 0xbf]);

/** Looks at every byte of a received file once. Refuses (422 at `/file`) what is no text that we take. */
export async function inspectFile(path: string): Promise<InspectedFile> {
  const hash = createHash('sha256');
  let head: Buffer = Buffer.alloc(0);
  let bytes = 0;
  let utf8 = true;
  /** The last bytes of a piece, which may be the beginning of a letter that the next one ends. */
  let cut: Buffer = Buffer.alloc(0);
  for await (const piece of createReadStream(path, {
    highWaterMark: HEAD,
  }) as AsyncIterable<Buffer>) {
    if (bytes === 0) refuseBinary(piece);
    if (head.length < HEAD) head = Buffer.concat([head, piece.subarray(0, HEAD - head.length)]);
    hash.update(piece);
    bytes += piece.length;
    if (!utf8) continue;
    const joined = cut.length > 0 ? Buffer.concat([cut, piece]) : piece;
    const end = lastLetterEnd(joined);
    utf8 = isUtf8(joined.subarray(0, end));
    cut = joined.subarray(end);
  }
  if (
    head
      .toString('latin1')
      .replace(/^\u00ef\u00bb\u00bf/, '')
      .trim() === ''
  ) {
    throw refused('the file is empty');
  }
  return {
    head,
    whole: bytes === head.length,
    sha256: hash.digest('hex'),
    encoding:
      head.subarray(0, 3).equals(BOM) || (utf8 && cut.length === 0) ? 'utf-8' : 'windows-1252',
  };
}

const WORKBOOK = 'this is a workbook; save it as CSV (UTF-8) and send that';
const ZIP = Buffer.from('PK');
const COMPOUND = Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1]);

function refuseBinary(head: Buffer): void {
  const startsAs = (magic: Buffer): boolean => head.subarray(0, magic.length).equals(magic);
  if (startsAs(COMPOUND) || (startsAs(ZIP) && (head[2] ?? 99) < 9)) throw refused(WORKBOOK);
  const first = head.readUIntBE(0, Math.min(2, head.length));
  if (first === 0xfffe || first === 0xfeff) {
    throw refused('the file is UTF-16; save it as CSV (UTF-8) and send that');
  }
  if (head.includes(0)) throw refused('this is no text file; send a CSV');
}

function refused(message: string): unknown {
  return refuseInput([{ path: '/file', message }]);
}

/** Where the last whole letter ends: up to three bytes may wait for the rest of theirs. */
function lastLetterEnd(bytes: Buffer): number {
  for (let back = 1; back <= Math.min(3, bytes.length); back += 1) {
    const byte = bytes[bytes.length - back] ?? 0;
    if (byte < 0x80) return bytes.length;
    const length = byte >= 0xf0 ? 4 : byte >= 0xe0 ? 3 : byte >= 0xc0 ? 2 : 0;
    if (length > 0) return length > back ? bytes.length - back : bytes.length;
  }
  return bytes.length;
}

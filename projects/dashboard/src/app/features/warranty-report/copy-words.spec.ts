import { webcrypto } from 'node:crypto';
import { issuedReport } from '../../testing/warranty-report-answers';
import { copyWords } from './copy-words';
import { sha256 } from './sha256';

describe('copyWords', () => {
  it('of the same bytes, says which file of the report it is', () => {
    expect(copyWords(issuedReport(), 'mine.pdf', 'a'.repeat(64))).toBe(
      'mine.pdf is the PDF of report 3, byte for byte.',
    );
    expect(copyWords(issuedReport(), 'mine.csv', 'b'.repeat(64))).toContain('is the CSV');
  });

  it('of other bytes, says that it is neither and gives its hash', () => {
    expect(copyWords(issuedReport(), 'mine.pdf', 'c'.repeat(64))).toBe(
      `mine.pdf is neither file of report 3: its SHA-256 is ${'c'.repeat(64)}.`,
    );
  });

  it('where nothing can be computed, says so', () => {
    expect(copyWords(issuedReport(), 'mine.pdf', undefined)).toContain('cannot compute');
  });
});

describe('sha256', () => {
  it('of the three letters of the standard’s first example, gives its digest (FIPS 180-2, B.1)', async () => {
    const before = globalThis.crypto;
    Object.defineProperty(globalThis, 'crypto', { configurable: true, value: webcrypto });
    const file = { arrayBuffer: () => Promise.resolve(Buffer.from('abc')) } as unknown as Blob;
    expect(await sha256(file)).toBe(
      'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
    );
    Object.defineProperty(globalThis, 'crypto', { configurable: true, value: before });
  });
});

/** SHA-256 of a file in hexadecimal; `undefined` where the browser does not offer it (a page served without encryption). */
export async function sha256(file: Blob): Promise<string | undefined> {
  const subtle = (globalThis.crypto as Partial<Crypto> | undefined)?.subtle;
  if (!subtle) return undefined;
  const digest = await subtle.digest('SHA-256', await file.arrayBuffer());
  return [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}

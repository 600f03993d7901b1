/** A stretch of a mail's text: plain, or an address that leads into this product. */
export interface MailPiece {
  readonly text: string;
  /** Path within the product, when the address leads here. */
  readonly path?: string;
}

/** Cuts a mail's text at its addresses; those of this very site become links, others stay text. */
export function mailPieces(text: string, origin: string): readonly MailPiece[] {
  return text
    .split(/(https?:\/\/[^\s<>"]+)/)
    .filter((piece) => piece !== '')
    .map((piece) => ({ text: piece, path: pathWithin(piece, origin) }));
}

/** Pages that are opened from a mail, with what its link carries. */
const MAILED: readonly string[] = ['/welcome', '/unsubscribe'];

function pathWithin(piece: string, origin: string): string | undefined {
  if (!/^https?:\/\//.test(piece) || !URL.canParse(piece)) return undefined;
  const address = new URL(piece);
  // The mail names the address the service knows itself by; on the pages of mailed links only the path matters.
  const ours = address.origin === origin || MAILED.includes(address.pathname);
  return ours ? address.pathname + address.search : undefined;
}

/** What a digest tells, before it is a letter: plain sentences and tables, a block a branch or region. */
export interface Digest {
  subject: string;
  opening: string;
  blocks: readonly DigestBlock[];
}

/** What is told of one branch, one region or the network. */
export interface DigestBlock {
  heading: string;
  sentences: readonly string[];
  lists: readonly DigestList[];
  picture: DigestPicture | null;
  /** A caution about people's safety, where it applies. */
  caution: string | null;
  /** Path of the page that shows it, and what stands on the link. */
  path: string;
  pathWords: string;
}

export interface DigestList {
  title: string;
  items: readonly string[];
}

/** A table whose first figure may be drawn as a bar beside its number; it says the same without the bar. */
export interface DigestPicture {
  caption: string;
  columns: readonly string[];
  rows: readonly DigestRow[];
}

export interface DigestRow {
  /** One text a column: a name, then figures. */
  cells: readonly string[];
  /** Length of the bar from 0 to 1; null where nothing is drawn. */
  bar: number | null;
}

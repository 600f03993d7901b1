/** One figure of the product and how it comes about. */
export interface Definition {
  /** Anchor on the page; figures link to it. */
  readonly id: string;
  readonly title: string;
  /** What it means, for someone who has to act on it. */
  readonly means: string;
  /** Formula, one line a step. */
  readonly formula?: readonly string[];
  /** What does not count, and what happens where something is missing. */
  readonly leftOut?: string;
  /** A published source, or "This product’s definition." */
  readonly source: string;
}

/** Definitions that belong together, under one heading. */
export interface DefinitionGroup {
  readonly id: string;
  readonly title: string;
  readonly definitions: readonly Definition[];
}

/** For figures that the product defines itself. */
export const OWN = 'This product’s definition.';

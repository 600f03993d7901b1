/** What a bar of the bridge stands for: the expected start, a step that gains or loses, or what was kept. */
export type BridgeRole = 'expected' | 'gain' | 'loss' | 'kept' | 'neutral';

/** One row of a bridge. `total` rows are drawn from 0, `step` rows from where the row above ended. */
export interface BridgeRow {
  readonly key: string;
  readonly label: string;
  readonly kind: 'total' | 'step';
  /** In any one unit; a step is signed. */
  readonly value: number;
  /** The value as it is read ("−735.00"). */
  readonly text: string;
  readonly role: BridgeRole;
  /** Set in 600: the ends, and the step that the page names. */
  readonly strong: boolean;
}

/** A bridge from a first total over steps to a last total. */
export interface BridgeInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly rows: readonly BridgeRow[];
}

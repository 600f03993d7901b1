/** A point of the curve; its words stand in the table twin. */
export interface CurvePoint {
  readonly x: number;
  readonly y: number;
}

/** How one value moves with another, with one point that the page speaks of. */
export interface ValueCurveInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly points: readonly CurvePoint[];
  readonly chosen: (CurvePoint & { readonly text: string }) | null;
  readonly xText: (x: number) => string;
  readonly yText: (y: number) => string;
}

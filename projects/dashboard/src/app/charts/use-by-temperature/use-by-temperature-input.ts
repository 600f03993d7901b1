/** Use in one class of workshop temperature. Quartiles null: too few cars, hatched. */
export interface TemperatureClass {
  readonly fromC: number;
  readonly toC: number;
  /** Cars behind it, as it is read. */
  readonly count: string;
  readonly quartiles: {
    readonly p25: number;
    readonly median: number;
    readonly p75: number;
  } | null;
}

/** Product a car by workshop temperature. */
export interface UseByTemperatureInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly classes: readonly TemperatureClass[];
  /** A value of the axis as it is read. */
  readonly tick: (value: number) => string;
}

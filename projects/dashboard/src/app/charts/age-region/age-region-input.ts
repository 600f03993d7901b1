/** A row that all regions share. */
export interface AgeRow {
  readonly key: string;
  /** As it is read: "10–14". */
  readonly label: string;
  /** The age that the page speaks of; it lies on a strip. */
  readonly chosen: boolean;
}

/** One age in one region. `share` null: too few cars, drawn as hatching with the words; no cars at all: left empty. */
export interface AgeRegionCell {
  readonly cars: number;
  /** Cars as they are read. */
  readonly count: string;
  readonly share: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
}

/** One region, small beside the others. */
export interface RegionPanel {
  readonly key: string;
  readonly name: string;
  /** What its air does, in words. */
  readonly air: string;
  /** Its cells, one an age in the order of the rows. */
  readonly cells: readonly AgeRegionCell[];
  /** Its share adjusted for age, as it is read, or why there is none. */
  readonly adjusted: string;
  /** The interval of that, or nothing. */
  readonly adjustedRange: string;
  /** A further word on it, or nothing: ages that had to be left out. */
  readonly adjustedNote: string;
}

/** Shares of cars by age, region by region. */
export interface AgeRegionInput {
  /** Text alternative: what the picture shows, as a sentence. */
  readonly summary: string;
  readonly rows: readonly AgeRow[];
  readonly panels: readonly RegionPanel[];
  /** The share to compare with, one an age in the order of the rows. */
  readonly references: readonly (number | null)[];
  /** What the reference is: "network". */
  readonly referenceWord: string;
}

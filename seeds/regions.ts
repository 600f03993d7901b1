import type { DemoRegion, RegionCode } from './demo-network';

/** A region and how its air and roads treat cars. Everything here is invented. */
export interface RegionNature extends DemoRegion {
  /** Rot hazard against an ordinary place. */
  rot: number;
  /** What the same work costs the customer here, against the Inner Sounds: rot is priced in by the sea. */
  price: number;
  /** Share of young cars added (+) or taken away (−): who brings a car in differs by place. */
  younger: number;
  /** How far a heated workshop lies from 16 °C over the year, °C. */
  workshopOffset: number;
}

/**
 * Four climates from dry upland to sea coast. With the dose-response function of ISO 9223:2012 for carbon steel their
 * first-year corrosion comes to about 7, 33, 53 and 83 µm: categories C2, C3, C4 and C5.
 */
export const REGIONS: readonly RegionNature[] = [
  {
    code: 'BRINE',
    name: 'Brine Coast',
    climate: { temperatureC: 9, humidityPct: 82, so2Deposition: 3, chlorideDeposition: 260 },
    rot: 2.7,
    price: 1.03,
    younger: 0.06,
    workshopOffset: 0.5,
  },
  {
    code: 'SOUND',
    name: 'Inner Sounds',
    climate: { temperatureC: 9, humidityPct: 80, so2Deposition: 4, chlorideDeposition: 110 },
    rot: 0.95,
    price: 1,
    younger: 0,
    workshopOffset: 0,
  },
  {
    code: 'PLAIN',
    name: 'River Plain',
    climate: { temperatureC: 10, humidityPct: 74, so2Deposition: 12, chlorideDeposition: 5 },
    rot: 0.82,
    price: 0.995,
    younger: 0,
    workshopOffset: 0.5,
  },
  {
    code: 'UPLND',
    name: 'Dry Uplands',
    climate: { temperatureC: 8.5, humidityPct: 62, so2Deposition: 1.2, chlorideDeposition: 1 },
    rot: 0.62,
    price: 0.985,
    younger: -0.04,
    workshopOffset: -1.5,
  },
];

/** The region with a code. */
export function regionOf(code: RegionCode): RegionNature {
  return REGIONS.find((region) => region.code === code) as RegionNature;
}

import { PLANTED_FACTS } from './planted-facts';
import type { RegionCode } from './demo-network';
import type { Check, Stage } from '#shared/domain/vocabulary';

/** What a branch is like: how busy, how dear, how careful. Quirks are the truths planted. Everything here is invented. */
export interface BranchNature {
  code: string;
  name: string;
  region: RegionCode;
  /** Weeks before today at which it opened; absent: before the five years. */
  openedWeeksBack?: number;
  carsPerWeek: number;
  /** Present hourly cost of labour, cents. */
  hourlyCostCents: number;
  /** Planned labour against the network's. */
  pace: number;
  /** Product against the norm. */
  generosity: number;
  /** How slowly bills are written, against the network. */
  billDelay: number;
  /** Whether it works on Saturdays too. */
  saturdays?: true;
  targetMarginShare?: number;
  quirk?: BranchQuirk;
}

export type BranchQuirk =
  | { kind: 'drifts' }
  | { kind: 'under-applies' }
  | { kind: 'skips'; check: Check }
  | { kind: 'no-claims' }
  | { kind: 'slow'; stage: Stage };

type Row = [
  code: string,
  name: string,
  region: RegionCode,
  carsPerWeek: number,
  hourlyCostCents: number,
  pace: number,
  generosity: number,
  billDelay: number,
  rest?: Partial<BranchNature>,
];

const facts = PLANTED_FACTS;

const ROWS: Row[] = [
  ['HAV', 'Havnsund', 'SOUND', 11, 3900, 1.0, 1.0, 1.1, { targetMarginShare: 0.38 }],
  ['HOL', 'Holmgarve', 'SOUND', 9.5, 3780, 0.98, 1.02, 0.8],
  ['SUN', 'Sundrask', 'SOUND', 8, 4020, 1.02, 0.98, 1.0],
  ['PEI', 'Peilhamre', 'SOUND', 10, 4100, 1.0, 1.0, 1.3, { saturdays: true }],
  ['LAN', 'Lanterby', 'SOUND', 10.5, 3850, 0.98, 1.0, 1.0, { quirk: skipping() }],
  ['KVA', 'Kvassund', 'SOUND', 7.5, 3700, 1.03, 1.03, 0.9, { openedWeeksBack: 178 }],
  ['BRI', 'Brimvarde', 'BRINE', 11.5, 4150, 1.0, 1.04, 1.0, { saturdays: true }],
  ['SKU', 'Skummarn', 'BRINE', 9, 4080, 0.98, 1.0, 1.2, { quirk: slow() }],
  ['TAN', 'Tangrolle', 'BRINE', 8, 3950, 1.01, 1.05, 0.9],
  ['DRI', 'Drivgarn', 'BRINE', 9.5, 4200, 0.99, 1.0, 1.0, { targetMarginShare: 0.36 }],
  ['SAL', 'Saltmyrke', 'BRINE', 7.5, 3880, 1.02, 1.01, 1.4],
  ['ODD', 'Oddeflane', 'BRINE', 8.5, 4000, 1.0, 0.99, 0.8, { openedWeeksBack: 126 }],
  ['MEL', 'Mellomflate', 'PLAIN', 12, 4480, 1.0, 1.0, 0.9, { saturdays: true }],
  ['KOR', 'Kornvidde', 'PLAIN', 10, 4200, 0.98, 0.97, 1.0],
  ['PLO', 'Ploggard', 'PLAIN', 10.5, 4050, 0.99, 1.0, 1.0, { quirk: { kind: 'under-applies' } }],
  ['ELV', 'Elvegryte', 'PLAIN', 9, 4120, 1.02, 1.03, 1.1],
  ['TEG', 'Teglmaur', 'PLAIN', 13, 4300, 0.97, 1.0, 0.8, { quirk: { kind: 'drifts' } }],
  ['VAD', 'Vadskrue', 'PLAIN', 8, 4000, 1.01, 1.0, 1.2, { openedWeeksBack: 213 }],
  ['TOR', 'Torrhalde', 'UPLND', 10, 3500, 1.0, 1.01, 1.0],
  ['GRA', 'Granvarpe', 'UPLND', 9, 3420, 0.99, 0.98, 0.9],
  ['STE', 'Steinlyre', 'UPLND', 8, 3360, 1.02, 1.0, 1.3, { targetMarginShare: 0.37 }],
  ['ULV', 'Ulvrygge', 'UPLND', 11, 3550, 1.0, 1.02, 1.0],
  ['HEI', 'Heigarde', 'UPLND', 4.5, 3300, 0.97, 1.0, 0.7, small()],
  ['FJE', 'Fjellduk', 'UPLND', 8.5, 3450, 1.01, 1.04, 1.0],
];

/** The 24 branches. */
export const BRANCHES: readonly BranchNature[] = ROWS.map(
  ([code, name, region, carsPerWeek, hourlyCostCents, pace, generosity, billDelay, rest]) => ({
    code,
    name,
    region,
    carsPerWeek,
    hourlyCostCents,
    pace,
    generosity,
    billDelay,
    ...rest,
  }),
);

/** IANA zone of a branch: the uplands lie one hour east. Zones without a place in their name, because no place here is real. */
export function timeZoneOf(region: RegionCode): string {
  return region === 'UPLND' ? 'EET' : 'CET';
}

function skipping(): BranchQuirk {
  return { kind: 'skips', check: facts.checkSkippingBranch.check };
}

function slow(): BranchQuirk {
  return { kind: 'slow', stage: facts.slowStageBranch.stage };
}

function small(): Partial<BranchNature> {
  return {
    openedWeeksBack: facts.goodSmallBranch.openedWeeksBack,
    quirk: { kind: 'no-claims' },
  };
}

import { BRANCHES, timeZoneOf } from './branches';
import { historyOf, openedOn } from './branch-history';
import { NORMS, PACKAGES, PRODUCTS } from './catalogue';
import { consumableCosts, fees, FIRST_FEE_RATE, hourlyCosts, productCosts } from './dated-costs';
import type { BranchHistory, DemoNetwork, DemoSetUp } from './demo-network';
import { REGIONS } from './regions';

/** The seed of the demo network that `npm start` fills an empty data folder with. */
export const DEMO_SEED = 20417;

/**
 * The demo network seen from a day: the same seed and day give the same network, byte for byte. Jobs run from five years
 * before that day to the day before it. Histories are made a branch at a time while they are read.
 */
export function generateNetwork({ seed, today }: { seed: number; today: string }): DemoNetwork {
  return { setUp: setUpOn(today), histories: () => histories(seed, today) };
}

function* histories(seed: number, today: string): Generator<BranchHistory> {
  for (const branch of BRANCHES) yield historyOf(branch, seed, today);
}

function setUpOn(today: string): DemoSetUp {
  return {
    network: {
      name: 'Rimhold Rust Protection',
      currency: 'EUR',
      feeRate: FIRST_FEE_RATE,
      targetMarginShare: 0.37,
      claimLimitCents: 60_000,
    },
    fees: fees(today),
    regions: REGIONS.map(({ code, name, climate }) => ({ code, name, climate })),
    branches: BRANCHES.map((branch) => ({
      code: branch.code,
      name: branch.name,
      region: branch.region,
      timeZone: timeZoneOf(branch.region),
      openedOn: openedOn(branch, today),
      ...(branch.targetMarginShare !== undefined && {
        targetMarginShare: branch.targetMarginShare,
      }),
    })),
    rates: hourlyCosts(today),
    products: PRODUCTS,
    productCosts: productCosts(today),
    consumableCosts: consumableCosts(today),
    packages: PACKAGES,
    norms: NORMS,
  };
}

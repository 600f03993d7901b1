/** A part of Set-up: its address below `/set-up` and its name. */
export interface Part {
  readonly path: string;
  readonly name: string;
}

/** The parts, in the order in which a network is set up. */
export const PARTS: readonly Part[] = [
  { path: 'network', name: 'Network and fee' },
  { path: 'regions', name: 'Regions' },
  { path: 'branches', name: 'Branches' },
  { path: 'products', name: 'Products' },
  { path: 'consumables', name: 'Consumables' },
  { path: 'packages', name: 'Packages and norms' },
  { path: 'people', name: 'People' },
];

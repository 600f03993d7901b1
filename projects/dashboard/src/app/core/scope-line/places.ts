/** A region with the branches one sees of it. */
export interface RegionBranches {
  readonly code: string;
  readonly name: string;
  readonly branches: readonly { readonly code: string; readonly name: string }[];
}

/** The branches that a choice of regions and branches means; none chosen means none ticked. */
export function tickedBranches(
  regions: readonly RegionBranches[],
  chosen: { readonly regions: readonly string[]; readonly branches: readonly string[] },
): ReadonlySet<string> {
  const all = regions.flatMap((region) =>
    region.branches.map((branch) => ({ code: branch.code, region: region.code })),
  );
  if (chosen.regions.length === 0 && chosen.branches.length === 0) return new Set();
  return new Set(
    all
      .filter(
        (branch) =>
          (chosen.regions.length === 0 || chosen.regions.includes(branch.region)) &&
          (chosen.branches.length === 0 || chosen.branches.includes(branch.code)),
      )
      .map((branch) => branch.code),
  );
}

/** The shortest way to say a set of branches: nothing when it is all or none of them, regions when it is whole regions, else the branches. */
export function placesOf(
  regions: readonly RegionBranches[],
  ticked: ReadonlySet<string>,
): { regions: string[]; branches: string[] } {
  const inhabited = regions.filter((region) => region.branches.length > 0);
  const whole = inhabited.filter((region) => region.branches.every((one) => ticked.has(one.code)));
  const inWhole = whole.flatMap((region) => region.branches).length;
  if (ticked.size === 0 || whole.length === inhabited.length) return { regions: [], branches: [] };
  if (inWhole === ticked.size) return { regions: whole.map((region) => region.code), branches: [] };
  return { regions: [], branches: [...ticked].sort() };
}

import type { Role } from '#shared/domain/vocabulary';

/** A branch as scope knows it. */
export interface ScopedBranch {
  readonly id: number;
  readonly code: string;
  readonly name: string;
  readonly region: string;
  readonly timeZone: string;
}

/** What a person was given: head office everything, a lead regions, the others branches. */
export interface Grant {
  readonly role: Role;
  readonly branchIds: readonly number[];
  readonly regionCodes: readonly string[];
}

/** What head office has: every branch. The work of schedules is done as it. */
export const HEAD_OFFICE: Grant = { role: 'head_office', branchIds: [], regionCodes: [] };

/**
 * The branches whose rows a caller may see. It can be made from a grant and narrowed by what was asked for, never widened;
 * its constructor is private so that no other code can make one.
 */
export class Scope {
  private constructor(
    /** Sorted by code. */
    readonly branches: readonly ScopedBranch[],
    /** What the caller may see before any narrowing: who stands outside it is judged by this (rule 21). */
    private readonly reach: Reach,
  ) {}

  /** No branch at all. */
  static readonly nothing = new Scope([], { branchIds: [], network: false });

  /** Everything a grant allows, out of all branches. */
  static ofGrant(all: readonly ScopedBranch[], grant: Grant): Scope {
    const branches = sorted(all.filter((branch) => allows(grant, branch)));
    return new Scope(branches, reachOf(branches, grant.role === 'head_office'));
  }

  /** The one branch of a push key. */
  static ofPushKey(all: readonly ScopedBranch[], branchId: number): Scope {
    const branches = all.filter((branch) => branch.id === branchId);
    return new Scope(branches, reachOf(branches, false));
  }

  /** One branch, as its writers and the work on its files see it. */
  static ofBranch(branch: ScopedBranch): Scope {
    return Scope.ofPushKey([branch], branch.id);
  }

  /** Allowed ∩ requested: repeats of one filter are OR, branch and region filters intersect (rule 22). */
  narrow(asked: { region?: readonly string[]; branch?: readonly string[] }): Scope {
    return new Scope(
      this.branches.filter(
        (branch) =>
          (!asked.region || asked.region.includes(branch.region)) &&
          (!asked.branch || asked.branch.includes(branch.code)),
      ),
      this.reach,
    );
  }

  /** The branch of a code, or `undefined` when it lies outside or does not exist. */
  branch(code: string): ScopedBranch | undefined {
    return this.branches.find((branch) => branch.code === code);
  }

  /** Codes of the branches and their regions, sorted, as an answer echoes them. */
  echo(): { regions: string[]; branches: string[] } {
    return {
      regions: [...new Set(this.branches.map((branch) => branch.region))].sort(),
      branches: this.branches.map((branch) => branch.code),
    };
  }

  /** The branch ids as the one value bound into every scoped statement. */
  get idsJson(): string {
    return JSON.stringify(this.branches.map((branch) => branch.id));
  }

  /** Whether the caller sees the whole network, so that no network figure can tell them of a stranger. */
  get ofNetwork(): boolean {
    return this.reach.network;
  }

  /** Whether a branch lies outside what the caller may see, whatever was asked for. */
  isOutside(branchId: number): boolean {
    return !this.reach.branchIds.includes(branchId);
  }

  /** Ids of everything that the caller may see, whatever was asked for, as the one value bound into a statement. */
  get reachJson(): string {
    return JSON.stringify(this.reach.branchIds);
  }

  /** A plain value that crosses into a worker. */
  pack(): PackedScope {
    return {
      branches: this.branches.map((branch) => ({ ...branch })),
      reach: { ...this.reach, branchIds: [...this.reach.branchIds] },
    } as unknown as PackedScope;
  }

  /** The scope that was packed; only for the worker at the other end. */
  static unpack(packed: PackedScope): Scope {
    return new Scope(packed.branches, packed.reach);
  }
}

declare const packed: unique symbol;
/** Branded, so that only `pack` makes one. */
export interface PackedScope {
  readonly [packed]: true;
  readonly branches: readonly ScopedBranch[];
  readonly reach: Reach;
}

/** What a caller may see before any narrowing. */
interface Reach {
  readonly branchIds: readonly number[];
  readonly network: boolean;
}

function reachOf(branches: readonly ScopedBranch[], network: boolean): Reach {
  return { branchIds: branches.map(({ id }) => id), network };
}

function allows(grant: Grant, branch: ScopedBranch): boolean {
  switch (grant.role) {
    case 'head_office':
      return true;
    case 'regional_lead':
      return grant.regionCodes.includes(branch.region);
    case 'site_manager':
    case 'recorder':
      return grant.branchIds.includes(branch.id);
  }
}

function sorted(branches: readonly ScopedBranch[]): ScopedBranch[] {
  return [...branches].sort((a, b) => (a.code < b.code ? -1 : 1));
}

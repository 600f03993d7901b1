import { ClaimWriter, type RecordedClaim } from '#db/claim-writer';
import { putPackageRow } from '#db/queries/set-up';
import type { ClaimDecision } from '#shared/domain/vocabulary';
import { makeRotStore } from './rot-store';
import { RECEIPT, type SmallStore } from './small-store';

/** Months of warranty by package, as the store of these tests sells them. */
export const SOLD_MONTHS = { full: 36, cavity: 24, bare: 0, long: 60 } as const;
export type SoldPackage = keyof typeof SOLD_MONTHS;

/** A claim as a test tells it; its job by reference. */
export type SentClaim = Omit<RecordedClaim, 'labourMinutes' | 'productMl'> & {
  /** A decision that waits for head office, with the claim open meanwhile. */
  proposed?: ClaimDecision;
};

/** A small store of nine branches with packages of 0, 24, 36 and 60 months of warranty. */
export async function makeWarrantyStore(): Promise<SmallStore> {
  const small = await makeRotStore();
  await small.store.queue.write(() => {
    for (const code of ['bare', 'long'] as const) {
      putPackageRow(small.store.unscoped, { code, name: code, warrantyMonths: SOLD_MONTHS[code] });
    }
    small.store.state.reload();
  });
  return small;
}

/** Writes a claim, new or as a correction, inside a write that is under way. */
export function writeClaim(
  small: SmallStore,
  branch: string,
  claimRef: string,
  { proposed, ...content }: SentClaim,
): void {
  const writer = new ClaimWriter(small.store, small.branch(branch));
  const job = writer.findJob(content.jobRef);
  if (!job) throw new Error(`no job ${content.jobRef} for claim ${claimRef}`);
  const claim = {
    ...{ content, text: JSON.stringify(content) },
    ...{ decision: content.decision, proposed: proposed ?? null },
  };
  writer.keepClaim(claimRef, job.id, writer.findClaim(claimRef), claim, RECEIPT);
}

/** A claim that is open and cost nothing yet. */
export function openClaim(
  jobRef: string,
  madeOn: string,
  over: Partial<SentClaim> = {},
): SentClaim {
  return { jobRef, madeOn, zone: 'floor', cause: 'thin_coverage', decision: 'open', ...over };
}

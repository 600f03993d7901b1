import type * as z from 'zod';
import { ClaimWriter } from '#db/claim-writer';
import type { ScopedBranch } from '#db/scope';
import type { Store } from '#db/store';
import { readClaim } from '#shared/contracts/check-claim';
import type { ClaimContent, putClaimBatch } from '#shared/contracts/claims';
import { reference, type FieldProblem } from '#shared/contracts/fields';
import { joined, problemsOf } from '#shared/contracts/read-problems';
import { Refusal } from '#shared/domain/refusal';
import { acceptClaim, type ClaimSending } from '#db/accept-claim';
import { breaksAgainstJob } from '#db/breaks-against-job';

type BatchAnswer = z.input<typeof putClaimBatch.out>;
type Result = BatchAnswer['results'][number];

/** Takes a batch of claims in the order sent: good ones are durable before this settles, bad ones are named. */
export async function acceptClaimBatch(
  store: Store,
  branch: ScopedBranch,
  items: readonly unknown[],
  today: string,
  sending: ClaimSending,
): Promise<BatchAnswer> {
  const read = items.map((item) => readItem(item, today));
  const results = await store.queue.write(() => {
    const writer = new ClaimWriter(store, branch);
    return read.map((item) => acceptItem(writer, item, sending));
  }, sending.actor.personId);
  const counts = { created: 0, replaced: 0, unchanged: 0, rejected: 0 };
  for (const result of results) counts[result.status] += 1;
  return { counts, results };
}

type ReadItem =
  | { claimRef: string; content: ClaimContent }
  | { claimRef: string | null; problems: readonly FieldProblem[]; raw: unknown };

function readItem(item: unknown, today: string): ReadItem {
  if (typeof item !== 'object' || item === null || Array.isArray(item)) {
    return { claimRef: null, problems: [{ path: '', message: 'must be an object' }], raw: item };
  }
  const { claimRef, ...content } = item as Record<string, unknown>;
  const ref = reference.safeParse(claimRef);
  const claim = readClaim(content, today);
  if (ref.success && 'content' in claim) return { claimRef: ref.data, content: claim.content };
  return {
    claimRef: ref.data ?? (typeof claimRef === 'string' ? claimRef : null),
    raw: content,
    problems: joined(
      ref.success ? [] : problemsOf(ref.error, '/claimRef'),
      'problems' in claim ? claim.problems : [],
    ),
  };
}

function acceptItem(writer: ClaimWriter, item: ReadItem, sending: ClaimSending): Result {
  if ('problems' in item) {
    return rejected(item.claimRef, joined(item.problems, breaksAgainstJob(writer, item.raw)));
  }
  try {
    return acceptClaim(writer, item.claimRef, item.content, sending);
  } catch (error) {
    // Refused before anything of the claim is written.
    if (error instanceof Refusal && error.kind === 'bad-input') {
      return rejected(item.claimRef, error.problems);
    }
    if (error instanceof Refusal && error.kind === 'forbidden') {
      return rejected(item.claimRef, [{ path: '/decision', message: error.detail }]);
    }
    throw error;
  }
}

function rejected(claimRef: string | null, problems: readonly FieldProblem[]): Result {
  return { claimRef, status: 'rejected', problems: [...problems] };
}

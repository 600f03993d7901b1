import { jobContent, type JobContent } from './jobs';
import type { FieldProblem } from './fields';
import { joined, problemsOf } from './read-problems';
import { breaksOfJob, type JobWorld } from '#shared/domain/job-rules';

/** What the rules of a job need of the network as it is now. */
export interface KnownCatalogue {
  productId(code: string): number | undefined;
  package(code: string): unknown;
}

/** The world of a branch on its local day, for a sender who sees money or one who does not. */
export function worldOf(
  catalogue: KnownCatalogue,
  today: string,
  money: 'seen' | 'unseen' = 'seen',
): JobWorld {
  return {
    today,
    ...(money === 'unseen' && { money }),
    isProduct: (code) => catalogue.productId(code) !== undefined,
    isPackage: (code) => catalogue.package(code) !== undefined,
  };
}

/** Reads one job of unknown shape: its content, or everything that is wrong with it at once (rule 57). */
export function readJob(
  raw: unknown,
  world: JobWorld,
): { content: JobContent } | { problems: readonly FieldProblem[] } {
  const parsed = jobContent.safeParse(raw);
  const broken = breaksOfJob(raw, world);
  if (parsed.success && broken.length === 0) return { content: parsed.data };
  return { problems: joined(parsed.success ? [] : problemsOf(parsed.error), broken) };
}

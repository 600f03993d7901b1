import type { LiveEvent } from '#shared/contracts/live';
import { formatCounted, formatList } from '../../ui/format';

const NAMES: Record<LiveEvent['kind'], [one: string, many: string]> = {
  jobs: ['job', 'jobs'],
  claims: ['claim', 'claims'],
  signals: ['signal', 'signals'],
};
const KINDS = Object.keys(NAMES) as LiveEvent['kind'][];
/** Above so many branches they are counted, not named. */
const MOST_NAMED = 2;

/** Tells in one line what came in, from where and when: "3 new jobs and 1 changed job from Havnsund, 08:12". */
export function liveSentence(
  events: readonly LiveEvent[],
  { time, branchName }: { readonly time: string; readonly branchName: (code: string) => string },
): string {
  const parts = KINDS.flatMap((kind) => {
    const [one, many] = NAMES[kind];
    const of = events.filter((event) => event.kind === kind);
    const added = sum(of.map((event) => event.added));
    const changed = sum(of.map((event) => event.count)) - added;
    return [
      ...(added > 0 ? [formatCounted(added, `new ${one}`, `new ${many}`)] : []),
      ...(changed > 0 ? [formatCounted(changed, `changed ${one}`, `changed ${many}`)] : []),
    ];
  });
  const branches = [...new Set(events.map(({ branch }) => branch))];
  const places =
    branches.length > MOST_NAMED
      ? formatCounted(branches.length, 'branch', 'branches')
      : formatList(branches.map(branchName));
  return `${formatList(parts)} from ${places}, ${time}`;
}

function sum(counts: readonly number[]): number {
  return counts.reduce((all, count) => all + count, 0);
}

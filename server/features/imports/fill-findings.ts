import { FINDING_PLACES } from '#shared/domain/import-fields-of-lists';
import type { RecordedFinding } from '#shared/domain/recorded-job';
import type { RowBody } from './row-body';

const KEYS = [
  'zone',
  'side',
  'seenAs',
  'workedAs',
  'structural',
  'action',
  'repairMinutes',
  'chargedCents',
] as const;

/**
 * Fills the findings of a job, place by place. One of the same zone and side as a stored one is that one (rule 71): it keeps its
 * reference, with its marks and photos, and what the file has no column for. A file whose columns name zones says all findings;
 * one with fewer places than the job has findings would take some away unsaid, and is refused.
 */
export function fillFindings(draft: RowBody, stored: readonly RecordedFinding[]): void {
  const { row } = draft;
  const places = Array.from({ length: FINDING_PLACES }, (_, at) => at + 1).filter((place) =>
    KEYS.some((key) => row.has(`finding${place}.${key}`)),
  );
  if (places.length === 0) return;
  const left = new Set(stored);
  const naming = places.some((place) => row.has(`finding${place}.zone`));
  const findings = places.flatMap((place) => {
    const of = (key: string): string => `finding${place}.${key}`;
    const empty = KEYS.every((key) => row.isEmpty(of(key)));
    const named = row.has(of('zone'));
    if (named && empty) return [];
    const known = named ? ofSamePlace(draft, place, left) : standing(stored[place - 1], left);
    if (!known && empty) return [];
    if (known) left.delete(known);
    return [{ known, place }];
  });
  if (naming && stored.length > places.length) {
    draft.problems.push({
      fills: null,
      message: `the stored job has ${stored.length} findings, the file has places for ${places.length}; add columns or leave those of findings out`,
    });
  }
  const kept = naming ? [] : [...left];
  draft.body['findings'] = [
    ...findings.map(({ known, place }, index) => {
      const finding: Record<string, unknown> = { ...known };
      for (const key of KEYS)
        draft.put(finding, `/findings/${index}`, key, `finding${place}.${key}`);
      return finding;
    }),
    ...kept,
  ];
}

/** The stored finding of the place that a row names; of several the first that no earlier place has taken. */
function ofSamePlace(
  { row }: RowBody,
  place: number,
  left: ReadonlySet<RecordedFinding>,
): RecordedFinding | undefined {
  const zone = row.value(`finding${place}.zone`);
  const side = row.value(`finding${place}.side`);
  return [...left].find(
    (known) => known.zone === zone && (!row.has(`finding${place}.side`) || known.side === side),
  );
}

function standing(
  known: RecordedFinding | undefined,
  left: ReadonlySet<RecordedFinding>,
): RecordedFinding | undefined {
  return known && left.has(known) ? known : undefined;
}

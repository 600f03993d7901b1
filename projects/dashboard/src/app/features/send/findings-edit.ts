import { CONDITIONS, type Side, type Zone } from '#shared/domain/vocabulary';
import type { UndersideFinding } from '../../underside-map/underside-input';
import { type DraftDocument, pathPart, valueAt, withValue } from './draft-document';

/** A finding as far as it is written down. */
export type DraftFinding = NonNullable<DraftDocument['findings']>[number];

const ORDINALS = ['First', 'Second', 'Third', 'Fourth', 'Fifth', 'Sixth', 'Seventh', 'Eighth'];

/** Path of a finding, or of one of its fields. */
export function findingPath(ref: string, field?: keyof DraftFinding): string {
  return `/findings${pathPart(ref)}${field === undefined ? '' : `/${field}`}`;
}

/** Sets a new finding at a place. Whether it is load-bearing there is always asked (rule 71); its reference is kept for good, so that photos stay with it. */
export function setFinding(
  document: DraftDocument,
  place: { readonly zone: Zone; readonly side: Side },
): { readonly document: DraftDocument; readonly ref: string } {
  const taken = new Set((document.findings ?? []).map(({ ref }) => ref));
  let number = 1;
  while (taken.has(`${place.zone}/${place.side}/${number}`)) number += 1;
  const ref = `${place.zone}/${place.side}/${number}`;
  const finding: DraftFinding = { ref, ...place };
  const findings = [...(document.findings ?? []), finding];
  return { document: withValue(document, '/findings', findings), ref };
}

/** Moves a finding to another place. */
export function moveFinding(
  document: DraftDocument,
  ref: string,
  place: { readonly zone: Zone; readonly side: Side },
): DraftDocument {
  const finding = valueAt(document, findingPath(ref)) as DraftFinding | undefined;
  return finding ? withValue(document, findingPath(ref), { ...finding, ...place }) : document;
}

/** Takes a finding off; without any left the car has none. */
export function removeFinding(document: DraftDocument, ref: string): DraftDocument {
  return withValue(document, findingPath(ref), undefined);
}

/** "Third finding". */
export function headingOf(document: DraftDocument, ref: string | undefined): string {
  const findings = document.findings ?? [];
  const index = findings.findIndex((one) => one.ref === ref);
  const number = index < 0 ? findings.length : index;
  return ORDINALS[number] ? `${ORDINALS[number]} finding` : `Finding ${number + 1}`;
}

/** Findings as the map marks them; one without its condition yet is drawn as the least. */
export function onMap(findings: readonly DraftFinding[]): readonly UndersideFinding[] {
  return findings.flatMap(({ ref, zone, side, seenAs, workedAs, structural, action }) =>
    zone && side
      ? [
          {
            ...{ ref, zone, side },
            seenAs: seenAs ?? CONDITIONS[0],
            workedAs: workedAs ?? null,
            structural: structural ?? false,
            action: action ?? null,
          },
        ]
      : [],
  );
}

/** Repair minutes of all findings. */
export function repairMinutesOf(document: DraftDocument): number {
  return (document.findings ?? []).reduce((sum, one) => sum + (one.repairMinutes ?? 0), 0);
}

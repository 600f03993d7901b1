import { CONDITIONS } from '#shared/domain/vocabulary';
import { shapesOf } from './geometry/place-shapes';
import { graverOf, lookOfCondition } from './finding-words';
import { placeKey, placeName } from './place-words';
import type { DrawnPlace } from './underside-car';
import type { UndersideFinding } from './underside-input';

/** The places of findings as the car draws them, each once, by the gravest of its findings. */
export function drawnFindings(findings: readonly UndersideFinding[]): readonly DrawnPlace[] {
  const gravestLast = [...findings].sort((a, b) => gravity(a) - gravity(b));
  const byPlace = new Map(gravestLast.map((finding) => [placeKey(finding), finding]));
  return [...byPlace].map(([key, finding]) => ({
    key,
    name: placeName(finding),
    look: lookOfCondition(graverOf(finding)),
    shapes: shapesOf(finding.zone, finding.side),
  }));
}

function gravity(finding: UndersideFinding): number {
  return CONDITIONS.indexOf(graverOf(finding));
}

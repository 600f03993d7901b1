import { STAGES, type BodyType, type Stage } from '#shared/domain/vocabulary';
import { BODY_SIZES } from './catalogue';
import type { PackageCode } from './demo-network';
import { chance, factorAround, type Random } from './random-draws';

export type Minutes = Record<Stage, number>;

/** Minutes estimated for a hatchback of middle age. Common practice, no source. */
const HATCHBACK: Record<PackageCode, Minutes> = {
  full: { strip: 90, clean: 75, dry: 20, repair: 0, mask: 40, apply: 120, refit: 60 },
  underbody: { strip: 75, clean: 75, dry: 20, repair: 0, mask: 40, apply: 70, refit: 45 },
  cavity: { strip: 50, clean: 30, dry: 15, repair: 0, mask: 25, apply: 85, refit: 45 },
  top_up: { strip: 30, clean: 25, dry: 10, repair: 0, mask: 15, apply: 40, refit: 20 },
};

/** What each stage takes against its estimate on a new car, and how much more each year of age adds: estimates know the package, hardly the car. */
const TRUTH: Record<Stage, { atNew: number; perYear: number }> = {
  strip: { atNew: 1.0, perYear: 0.021 },
  clean: { atNew: 1.02, perYear: 0.027 },
  dry: { atNew: 1.03, perYear: 0.01 },
  repair: { atNew: 1, perYear: 0 },
  mask: { atNew: 1, perYear: 0.003 },
  apply: { atNew: 1, perYear: 0.005 },
  refit: { atNew: 1.01, perYear: 0.019 },
};

/** The minutes that a branch writes into its estimate. Repair is rarely in it at all. */
export function estimateMinutes(
  random: Random,
  packageCode: PackageCode,
  bodyType: BodyType,
  years: number,
): Minutes {
  const time = BODY_SIZES[bodyType].time * (1 + 0.004 * Math.min(years, 20));
  const minutes = eachStage((stage) =>
    rounded(HATCHBACK[packageCode][stage] * time * factorAround(random, 0.04)),
  );
  if (years >= 12 && chance(random, 0.09)) minutes.repair = chance(random, 0.5) ? 60 : 90;
  return minutes;
}

export interface LabourCircumstances {
  packageCode: PackageCode;
  bodyType: BodyType;
  years: number;
  hasRot: boolean;
  /** Σ repair minutes of the findings. */
  repairMinutes: number;
  temperatureC: number;
  /** The branch's pace, with anything planted in it. */
  pace: number;
  slowStage?: { stage: Stage; times: number };
}

/** The minutes that the job really took. */
export function workMinutes(random: Random, at: LabourCircumstances): Minutes {
  const age = Math.min(at.years, 24);
  const time = BODY_SIZES[at.bodyType].time * at.pace * factorAround(random, 0.06);
  const cold = Math.max(0, 16 - at.temperatureC);
  const minutes = eachStage((stage) => {
    if (stage === 'repair') return 0;
    const truth = TRUTH[stage];
    let factor = truth.atNew + truth.perYear * age;
    if (at.hasRot && (stage === 'strip' || stage === 'clean')) factor *= 1.05;
    if (stage === 'dry') factor *= 1 + 0.03 * cold;
    if (stage === 'apply') factor *= 1 + 0.008 * cold;
    if (at.slowStage?.stage === stage) factor *= at.slowStage.times;
    return rounded(HATCHBACK[at.packageCode][stage] * time * factor * factorAround(random, 0.1));
  });
  // Setting up and the fire watch belong to no finding of their own.
  minutes.repair = at.repairMinutes > 0 ? rounded(at.repairMinutes * 1.04 + 2) : 0;
  return minutes;
}

function eachStage(minutesOf: (stage: Stage) => number): Minutes {
  return Object.fromEntries(STAGES.map((stage) => [stage, minutesOf(stage)])) as Minutes;
}

/** People write minutes in fives. */
function rounded(minutes: number): number {
  return Math.round(minutes / 5) * 5;
}

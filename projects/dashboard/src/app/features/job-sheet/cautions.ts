import type { JobSheet } from '#shared/contracts/jobs';
import { isLeftDangerous } from '#shared/domain/danger';
import { isRot } from '#shared/domain/recorded-job';

/** A danger to people that this job brings with it. */
export interface SheetCaution {
  readonly danger: string;
  readonly words: string;
}

/** The cautions of a job, the gravest first. The product informs, it does not certify. */
export function cautionsOf(job: JobSheet): readonly SheetCaution[] {
  const findings = job.findings ?? [];
  const welded =
    (job.actual.stages.repair ?? 0) > 0 || findings.some((one) => one.action === 'patched');
  const cautions: SheetCaution[] = [];
  if (findings.some(isLeftDangerous)) {
    cautions.push({
      danger: 'Left on the car',
      words:
        'Load-bearing rot was not repaired. The car may not be fit for the road: tell the owner in writing, and note the date.',
    });
  }
  if (findings.some((one) => one.zone === 'jacking_point' && isRot(one))) {
    cautions.push({
      danger: 'Lifting',
      words:
        'A jacking point of this car has rot. Support it on sound, rated points only, never on that one.',
    });
  }
  if (welded) {
    cautions.push({
      danger: 'Fire',
      words:
        'Welding near fuel and brake lines, the tank, airbags, wiring and sprayed wax: clear or shield them first, keep a fire watch after.',
    });
  }
  if (findings.some((one) => one.structural && one.action === 'patched')) {
    cautions.push({
      danger: 'Structural repair',
      words:
        'It is for a competent and, where required, licensed person; the local inspection rules decide whether it is enough.',
    });
  }
  return cautions;
}

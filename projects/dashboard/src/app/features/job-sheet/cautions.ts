import type { JobSheet } from '#shared/contracts/jobs';
import { isLeftDangerous } from '#shared/domain/danger';
import { isRot } from '#shared/domain/recorded-job';
import {
  FIRE,
  LEFT_ON_CAR,
  LOAD_BEARING_REPAIR,
  ROTTEN_POINT,
  type Danger,
} from '../../ui/caution/dangers';

/** The cautions of a job, the gravest first. The product informs, it does not certify. */
export function cautionsOf(job: JobSheet): readonly Danger[] {
  const findings = job.findings ?? [];
  const welded =
    (job.actual.stages.repair ?? 0) > 0 || findings.some((one) => one.action === 'patched');
  const rottenPoint = findings.some((one) => one.zone === 'jacking_point' && isRot(one));
  const repaired = findings.some((one) => one.structural && one.action === 'patched');
  return [
    ...(findings.some(isLeftDangerous) ? [LEFT_ON_CAR] : []),
    ...(rottenPoint ? [ROTTEN_POINT] : []),
    ...(welded ? [FIRE] : []),
    ...(repaired ? [LOAD_BEARING_REPAIR] : []),
  ];
}

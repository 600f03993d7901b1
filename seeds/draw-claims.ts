import { addMonths, ageInYears, dateOfDay, dayNumber } from '#shared/domain/calendar';
import { halfYearOf } from '#shared/domain/half-year';
import type { ClaimCause, ClaimDecision, Zone } from '#shared/domain/vocabulary';
import type { JobContent } from '#shared/contracts/jobs';
import type { BranchNature } from './branches';
import { PACKAGES } from './catalogue';
import { levelOn } from './dated-costs';
import { newestContent, type DemoClaim, type DemoJob, type PackageCode } from './demo-network';
import { evening } from './job-arrival';
import { badCohortOn, PLANTED_FACTS } from './planted-facts';
import { between, chance, pickWeighted, wholeBetween, type Random } from './random-draws';
import { workingDayAfter } from './working-calendar';

/** Chance of a claim in 36 months for an ordinary car with every check done. */
const USUAL_CHANCE = 0.0225;
const BY_PACKAGE: Record<PackageCode, number> = {
  full: 1,
  cavity: 1.3,
  underbody: 1.25,
  top_up: 0.8,
};
const WARRANTY_MONTHS = new Map<string, number>(PACKAGES.map((p) => [p.code, p.warrantyMonths]));

/** The claims made on a branch's jobs up to yesterday, oldest first. */
export function drawClaims(
  random: Random,
  branch: BranchNature,
  jobs: readonly DemoJob[],
  today: string,
): DemoClaim[] {
  if (branch.quirk?.kind === 'no-claims') return [];
  const badCohort = badCohortOn(today);
  const made: { jobRef: string; job: JobContent; madeOn: string }[] = [];
  for (const job of jobs) {
    if (job.voided) continue;
    const content = newestContent(job);
    if (!chance(random, claimChance(branch, content, badCohort))) continue;
    const times = chance(random, 0.04) ? 2 : 1;
    for (let time = 0; time < times; time += 1) {
      const madeOn = claimDate(random, content.completedOn, content.package);
      // A claim on the day itself has not come in yet when the day begins.
      if (madeOn !== undefined && madeOn < today)
        made.push({ jobRef: job.jobRef, job: content, madeOn });
    }
  }
  made.sort((a, b) => (a.madeOn < b.madeOn ? -1 : a.madeOn > b.madeOn ? 1 : 0));
  return made.map((claim, index) => ({
    branchCode: branch.code,
    claimRef: `W-${String(index + 1).padStart(4, '0')}`,
    ...settle(random, branch, claim, today),
  }));
}

function claimChance(branch: BranchNature, job: JobContent, badCohort: string): number {
  const facts = PLANTED_FACTS;
  const years = ageInYears(job.vehicle.firstRegistered, job.completedOn);
  let p = USUAL_CHANCE * BY_PACKAGE[job.package as PackageCode];
  p *= 0.7 + 0.035 * Math.min(years, 20);
  if (branch.region === facts.saltRegion.region) p *= 1.15;
  if (branch.quirk?.kind === 'under-applies') p *= facts.underApplyingBranch.claimsTimes;
  if (halfYearOf(job.completedOn) === badCohort) p *= facts.badCohort.claimsTimes;
  if (job.checks?.bothDirections === 'no') p *= facts.checkSkippingBranch.claimsTimes;
  if (job.checks?.driedOut === 'no') p *= 1.7;
  if (job.checks?.drainsClear === 'no') p *= 1.6;
  return Math.min(0.6, p);
}

/** Year of cover: the second winter shows what the first one started. */
const BY_YEAR = [0.16, 0.54, 0.3];

/** The day of a claim; now and then after the warranty has run out, else `undefined` when the month drawn lies beyond it. */
function claimDate(random: Random, completedOn: string, packageCode: string): string | undefined {
  const months: [number, number][] = [];
  for (let month = 2; month <= 36; month += 1) {
    const calendarMonth = (Number(completedOn.slice(5, 7)) + month - 1) % 12;
    const winter = calendarMonth >= 10 || calendarMonth <= 3 ? 2.2 : 0.6;
    months.push([month, (BY_YEAR[Math.floor((month - 1) / 12)] as number) * winter]);
  }
  const month = pickWeighted(random, months);
  const day = dayNumber(addMonths(completedOn, month - 1)) + wholeBetween(random, 2, 27);
  const madeOn = dateOfDay(workingDayAfter(day, 'to-friday'));
  const end = addMonths(completedOn, WARRANTY_MONTHS.get(packageCode) ?? 0);
  return madeOn <= end || chance(random, 0.05) ? madeOn : undefined;
}

function settle(
  random: Random,
  branch: BranchNature,
  claim: { jobRef: string; job: JobContent; madeOn: string },
  today: string,
): Pick<DemoClaim, 'content' | 'receivedAt'> {
  const { jobRef, job, madeOn } = claim;
  const end = addMonths(job.completedOn, WARRANTY_MONTHS.get(job.package) ?? 0);
  const cause = madeOn > end ? 'not_covered' : drawCause(random, branch, job);
  const decidedDay = workingDayAfter(dayNumber(madeOn) + wholeBetween(random, 3, 40), 'to-friday');
  const decided = decidedDay < dayNumber(today);
  const decision: ClaimDecision = decided ? decide(random, cause) : 'open';
  const paid = decision === 'accepted' || decision === 'goodwill';
  const labourMinutes = wholeBetween(random, 12, 60) * 5;
  const productMl = wholeBetween(random, 4, 30) * 50;
  const level = levelOn(madeOn, today);
  // Hours and product at cost, and something for steel, paint or a hire car.
  const cost =
    ((labourMinutes / 60) * branch.hourlyCostCents * 1.15 + productMl * 1.2) * level +
    between(random, 1500, 16000);
  const paidDay = workingDayAfter(decidedDay + wholeBetween(random, 5, 60), 'to-friday');
  return {
    content: {
      jobRef,
      madeOn,
      zone: drawZone(random, job),
      cause,
      decision,
      ...(decided && { decidedOn: dateOfDay(decidedDay) }),
      labourMinutes: paid ? labourMinutes : 0,
      productMl: paid ? productMl : 0,
      costCents: paid ? Math.round(cost / 100) * 100 : 0,
      ...(paid && paidDay < dayNumber(today) && { paidOn: dateOfDay(paidDay) }),
    },
    receivedAt: evening(random, decided ? decidedDay : dayNumber(madeOn)),
  };
}

function drawCause(random: Random, branch: BranchNature, job: JobContent): ClaimCause {
  const thin = branch.quirk?.kind === 'under-applies' ? 0.7 : 0.26;
  return pickWeighted<ClaimCause>(random, [
    ['missed_area', job.checks?.bothDirections === 'no' ? 0.85 : 0.3],
    ['thin_coverage', thin],
    ['drain_blocked', job.checks?.drainsClear === 'no' ? 0.6 : 0.14],
    ['damage', 0.14],
    ['not_covered', 0.1],
  ]);
}

function decide(random: Random, cause: ClaimCause): ClaimDecision {
  const [accepted, goodwill] =
    cause === 'not_covered' ? [0.04, 0.16] : cause === 'damage' ? [0.3, 0.3] : [0.86, 0.08];
  const draw = between(random, 0, 1);
  return draw < accepted ? 'accepted' : draw < accepted + goodwill ? 'goodwill' : 'refused';
}

/** Where it came back: for the most part where rot was met before, or low down. */
function drawZone(random: Random, job: JobContent): Zone {
  const found = job.findings?.[0]?.zone;
  if (found && chance(random, 0.5)) return found;
  return pickWeighted<Zone>(random, [
    ['rear_arch', 24],
    ['sill_outer', 26],
    ['sill_inner', 14],
    ['front_arch', 10],
    ['door_bottom', 10],
    ['bulkhead_drain', 6],
    ['floor', 6],
    ['tailgate', 4],
  ]);
}

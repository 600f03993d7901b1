import type { JobContent } from '#shared/contracts/jobs';
import { dateOfDay } from '#shared/domain/calendar';
import { agreeExtras, billTotal } from './bills';
import type { BranchWays } from './branch-quirks';
import type { BranchNature } from './branches';
import { monthNumber, monthText, type Car } from './cars';
import { drawConsumables } from './consumables';
import { levelOn } from './dated-costs';
import type { PackageCode } from './demo-network';
import { estimateMinutes, workMinutes } from './labour';
import { drawChecks } from './process-checks';
import { drawProducts } from './product-use';
import { quotePrice, saleHourCents } from './quotes';
import { chance, type Random } from './random-draws';
import { regionOf } from './regions';
import { drawFindings, workOpenRot } from './rot-findings';
import { drawWorkshopAir } from './workshop-air';

export interface JobOccasion {
  branch: BranchNature;
  ways: BranchWays;
  car: Car;
  packageCode: PackageCode;
  /** Day numbers. */
  bookedDay: number;
  startedDay: number;
  completedDay: number;
  today: string;
}

/** A finished job and what its bill will say once it is written. */
export interface DrawnJob {
  content: JobContent;
  billCents: number;
}

/** One car through the workshop: estimate, what was found, what it took, what went in, what was agreed. */
export function drawJob(random: Random, occasion: JobOccasion): DrawnJob {
  const { branch, ways, car, packageCode, today } = occasion;
  const bodyType = car.model.bodyType;
  const bookedOn = dateOfDay(occasion.bookedDay);
  const startedOn = dateOfDay(occasion.startedDay);
  const completedOn = dateOfDay(occasion.completedDay);
  const years = Math.floor((monthNumber(completedOn) - car.registeredMonth) / 12);
  const level = levelOn(bookedOn, today);
  const region = regionOf(branch.region);

  const quotedCents = quotePrice(random, branch, packageCode, bodyType, years, level);
  const estimate = {
    priceCents: quotedCents,
    stages: estimateMinutes(random, packageCode, bodyType, years),
  };
  const workshop = drawWorkshopAir(random, occasion.completedDay, region);
  const found =
    car.open.length > 0 ? workOpenRot(random, car) : drawFindings(random, car, years, region.rot);
  const repairMinutes = found.reduce((all, finding) => all + (finding.repairMinutes ?? 0), 0);
  const extra = agreeExtras(random, found, years, startedOn, saleHourCents(branch, level));
  const checks = drawChecks(random, packageCode, found, ways.skipped);
  const stages = workMinutes(random, {
    packageCode,
    bodyType,
    years,
    hasRot: found.some((finding) => finding.seenAs !== 'surface'),
    repairMinutes,
    temperatureC: workshop.temperatureC,
    pace: ways.pace,
    slowStage: ways.slowStage,
  });
  const content: JobContent = {
    vehicle: {
      key: car.key,
      make: car.model.make,
      model: car.model.model,
      bodyType,
      firstRegistered: monthText(car.registeredMonth),
      ...(chance(random, 0.95) && { odometerKm: car.odometerKm }),
    },
    package: packageCode,
    bookedOn,
    startedOn,
    completedOn,
    ...(!chance(random, 0.014) && { estimate }),
    ...(extra.agreedExtras.length > 0 && { agreedExtras: extra.agreedExtras }),
    actual: { stages },
    products: drawProducts(
      random,
      packageCode,
      bodyType,
      workshop.temperatureC,
      ways.generosity,
      found,
    ),
    consumables: drawConsumables(random, packageCode, years, found, levelOn(completedOn, today)),
    ...(extra.boughtInCents > 0 && { boughtInCents: extra.boughtInCents }),
    ...(extra.findings.length > 0 && { findings: extra.findings }),
    ...(checks && { checks }),
    ...(chance(random, 0.97) && { workshop }),
  };
  return {
    content,
    billCents: billTotal(random, quotedCents, extra.billedExtrasCents, ways.givenAway),
  };
}

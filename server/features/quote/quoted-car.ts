import type { QuotedCar } from '#db/queries/quote';
import { addMonths } from '#shared/domain/calendar';
import { modelKey } from '#shared/domain/recorded-job';
import type { BodyType } from '#shared/domain/vocabulary';

/** What is asked about a car that has not been done yet. */
export interface AskedCar {
  make: string;
  model: string;
  firstRegistered: string;
  bodyType: BodyType;
  packageId: number;
  today: string;
}

/** How far back the cars of a set go, in months (rule 48). */
const MONTHS = 36;

/** The car as the facts of others are compared with it. */
export function quotedCar(asked: AskedCar, ageBandIndex: number): QuotedCar {
  return {
    packageId: asked.packageId,
    modelKey: modelKey(asked.make, asked.model),
    bodyType: asked.bodyType,
    ageBandIndex,
    after: addMonths(asked.today, -MONTHS),
    upTo: asked.today,
  };
}

import type { NetworkReference } from '#db/network-reference';
import { readCostsOfDay } from '#db/queries/costs-of-day';
import { readQuoteTargets } from '#db/queries/quote-targets';
import type { ScopedDb } from '#db/scoped-db';
import type { QuoteAnswer } from '#shared/contracts/quote';
import { ageBand, ageInYears } from '#shared/domain/calendar';
import { roundHalfUp } from '#shared/domain/money';
import type { QuoteMinutes } from '#shared/domain/quote-minutes';
import { shareOf } from '#shared/domain/small-samples';
import { AGE_BANDS, STAGES } from '#shared/domain/vocabulary';
import { nearestSet, type NearestSet } from './nearest-set';
import { quoteCosts } from './quote-costs';
import { quotePriceOf, type WantedMargin } from './quote-price-of';
import { quotedCar, type AskedCar } from './quoted-car';

/** What a quote is asked for; the branch is the reader's only one. */
export interface QuoteQuestion extends AskedCar {
  marginShare: number | undefined;
  money: 'seen' | 'unseen';
}

/** A quote from the nearest set of cars; without a branch in scope it is made from none. One snapshot of the database. */
export function answerQuote(
  db: ScopedDb,
  question: QuoteQuestion,
  reference: NetworkReference,
): QuoteAnswer {
  return db.snapshot(() => {
    const { today, money } = question;
    const [branch] = db.scope.branches;
    const age = ageBand(ageInYears(question.firstRegistered, today));
    const set = branch && nearestSet(db, reference, quotedCar(question, AGE_BANDS.indexOf(age)));
    const costs = branch && readCostsOfDay(db, today);
    const { cost, ...price } = quotePriceOf(
      set && costs && quoteCosts(set.figures, branch.code, costs),
      costs?.feeMicros,
      wantedMargin(db, question),
    );
    return {
      on: today,
      ageBand: age,
      basis: set
        ? { kind: set.kind, source: set.source, cars: set.figures.cars }
        : { kind: 'none', source: null, cars: 0 },
      ...figuresOf(set),
      ...price,
      ...(money === 'seen' && { cost }),
    };
  });
}

/** The margin asked for, or the branch's target, or the network's (rules 24 and 80). */
function wantedMargin(db: ScopedDb, { marginShare }: QuoteQuestion): WantedMargin {
  if (marginShare !== undefined) return { share: marginShare, from: 'asked' };
  const [branch] = db.scope.branches;
  const targets = branch && readQuoteTargets(db, branch.id);
  if (targets && targets.branch !== null) return { share: targets.branch, from: 'branch' };
  if (targets && targets.network !== null) return { share: targets.network, from: 'network' };
  return { share: null, from: null };
}

function figuresOf(
  set: NearestSet | undefined,
): Pick<QuoteAnswer, 'labour' | 'rot' | 'openedUp' | 'products'> {
  const figures = set?.figures;
  const { cars = 0, withRot = 0, bubblesWorked = 0, bubblesHoled = 0 } = figures ?? {};
  const byStage = new Map(figures?.stages.map(({ stage, minutes }) => [stage, minutes]));
  return {
    labour: {
      ...wholeMinutes(figures?.minutes),
      stages: STAGES.map((stage) => ({ stage, ...wholeMinutes(byStage.get(stage)) })),
    },
    rot: { cars, withRot, ...shareOf(withRot, cars) },
    openedUp: {
      worked: bubblesWorked,
      holed: bubblesHoled,
      ...shareOf(bubblesHoled, bubblesWorked),
    },
    products: (figures?.products ?? []).map(({ product, ml }) => ({ product, ml: ml / cars })),
  };
}

/** Quantiles as they are shown: whole minutes, rounded half up (rule 52). */
function wholeMinutes(minutes: QuoteMinutes | undefined): {
  p50Minutes: number | null;
  p80Minutes: number | null;
} {
  return {
    p50Minutes: minutes ? roundHalfUp(minutes.p50Halves, 2) : null,
    p80Minutes: minutes ? roundHalfUp(minutes.p80Fifths, 5) : null,
  };
}

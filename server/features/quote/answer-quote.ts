import type { NetworkReference } from '#db/network-reference';
import type { ScopedDb } from '#db/scoped-db';
import type { QuoteAnswer } from '#shared/contracts/quote';
import type { BodyType } from '#shared/domain/vocabulary';

/** What a quote is asked for; the branch is the reader's only one. */
export interface QuoteQuestion {
  make: string;
  model: string;
  firstRegistered: string;
  bodyType: BodyType;
  packageId: number;
  today: string;
  marginShare: number | undefined;
  money: 'seen' | 'unseen';
}

/** A quote from the nearest set of cars. */
export function answerQuote(
  _db: ScopedDb,
  _question: QuoteQuestion,
  _reference: NetworkReference,
): QuoteAnswer {
  throw new Error('not built yet');
}

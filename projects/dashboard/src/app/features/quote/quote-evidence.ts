import type { Params } from '@angular/router';
import type { QuoteAnswer } from '#shared/contracts/quote';
import { addDays, addMonths } from '#shared/domain/calendar';
import { BODY_TYPE_PLURALS } from '../../ui/words';
import type { QuoteQuestion } from './quote-question';

/** Months that a quote looks back (rule 48). */
const MONTHS = 36;

type Asked = Pick<QuoteAnswer, 'basis' | 'ageBand' | 'on'>;

/** The cars that a quote is made from, in words: "cars of this model and age at this branch". */
export function evidenceWords({ basis, ageBand }: Asked, { bodyType }: QuoteQuestion): string {
  const where = basis.source === 'network' ? 'in the whole network' : 'at this branch';
  switch (basis.kind) {
    case 'model_age':
      return `cars of this model and age ${where}`;
    case 'body_age':
      return `${BODY_TYPE_PLURALS[bodyType]} aged ${ageWords(ageBand)} years ${where}`;
    case 'age':
      return `cars aged ${ageWords(ageBand)} years ${where}, of any body type`;
    default:
      return `cars with this package ${where}, of any age`;
  }
}

function ageWords(band: string): string {
  return band.replace('-', '–');
}

/** Why it was not a nearer set; nothing where it was the nearest. */
export function evidenceReason({ basis }: Asked): string {
  if (basis.kind === 'none' || (basis.kind === 'model_age' && basis.source === 'branch')) return '';
  return 'No nearer set has 30 cars in three years.';
}

/** Those cars in Jobs, where they are the branch's own; the network's are nobody's to look at. */
export function carsBehind({ basis, ageBand, on }: Asked, question: QuoteQuestion): Params | null {
  if (basis.source !== 'branch' || basis.kind === 'none') return null;
  const { make, model, bodyType, branch } = question;
  const own = {
    branch,
    package: question.package,
    from: addDays(addMonths(on, -MONTHS), 1),
    to: on,
  };
  switch (basis.kind) {
    case 'model_age':
      return { ...own, make, model, ageBand };
    case 'body_age':
      return { ...own, bodyType, ageBand };
    case 'age':
      return { ...own, ageBand };
    default:
      return own;
  }
}

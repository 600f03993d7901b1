import { comeBackList, comeBackRow } from '../../testing/come-back-answers';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatDate } from '../../ui/format';
import { answerComeBacks } from './come-back-answer';

const TODAY = '2026-02-02';
const plain = (parts: readonly AnswerPart[]): string =>
  parts
    .map((part) => {
      if (typeof part === 'string') return part;
      if ('figure' in part) return part.figure;
      return 'quiet' in part ? part.quiet : part.text;
    })
    .join('');

describe('answerComeBacks', () => {
  it('dangerous ones on cars: counts them, what stands behind, and whose owner does not know', () => {
    const list = comeBackList([comeBackRow('0417')], {
      dangerous: 9,
      dangerousNotTold: 2,
      findings: 41,
      cars: 30,
    });
    const { sentence, second } = answerComeBacks(list, undefined, TODAY);
    expect(plain(sentence)).toBe(
      '9 dangerous findings are still on cars (41 findings, 30 cars); of 2 the owner has not been told in writing.',
    );
    expect(plain(second)).toBe(
      'Begin here: tell the owner of the Velder Tessock 2009 in writing; sill, inner, left, for 13 weeks.',
    );
    expect(second[1]).toMatchObject({ link: '/jobs/HAV/0417' });
  });

  it('one dangerous, its owner told and a day passed: says so in the singular and begins with the day', () => {
    const told = comeBackRow('0417', { ownerToldOn: '2025-11-04', dueOn: '2026-01-30' });
    const { sentence, second } = answerComeBacks(comeBackList([told]), undefined, TODAY);
    expect(plain(sentence)).toBe(
      '1 dangerous finding is still on a car (1 finding, 1 car); its owner has been told in writing.',
    );
    expect(plain(second)).toBe(
      `Begin here: the Velder Tessock 2009 was due on ${formatDate('2026-01-30')}.`,
    );
  });

  it('several days passed: the oldest first, the others counted', () => {
    const rows = ['2026-01-30', '2026-01-12', '2026-03-01'].map((dueOn, index) =>
      comeBackRow(`041${index}`, { dueOn, ownerToldOn: '2025-11-04' }),
    );
    expect(plain(answerComeBacks(comeBackList(rows), undefined, TODAY).second)).toContain(
      `due on ${formatDate('2026-01-12')}, and 1 other is past theirs`,
    );
  });

  it('nothing dangerous: says so, with the number that is left', () => {
    const rows = [comeBackRow('1', { structural: false }), comeBackRow('2', { structural: false })];
    expect(plain(answerComeBacks(comeBackList(rows), undefined, TODAY).sentence)).toBe(
      '2 findings are still on cars (2 cars), none of them dangerous.',
    );
  });

  it('narrowed to a status: counts what stands so', () => {
    const list = comeBackList([comeBackRow('1', { status: 'booked' })]);
    expect(plain(answerComeBacks(list, 'booked', TODAY).sentence)).toBe(
      '1 finding stands as “booked in” (1 car), 1 dangerous.',
    );
  });

  it('done ones: proposes nothing to do', () => {
    const list = comeBackList([comeBackRow('1', { status: 'done' })]);
    expect(answerComeBacks(list, 'done', TODAY).second).toEqual([]);
  });

  it('none at all: says so and how to look further', () => {
    const { sentence, second } = answerComeBacks(comeBackList([]), undefined, TODAY);
    expect(plain(sentence)).toBe('No finding is left on a car here.');
    expect(plain(second)).toContain('line above');
  });
});

import {
  overrunAnswer,
  overrunGroup,
  smallGroup,
  stageGroups,
} from '../../testing/overrun-answers';
import type { AnswerPart } from '../../ui/answer/answer';
import { answerOverrun } from './overrun-answer';
import type { OverrunWords } from './overrun-words';

const words: OverrunWords = { branchName: (c) => c, regionName: (c) => c, packageName: (c) => c };

function say(more: Parameters<typeof overrunAnswer>[2] = {}, groups = stageGroups()) {
  const { sentence, second } = answerOverrun(overrunAnswer('stage', groups, more), words);
  return { first: text(sentence), second: text(second) };
}

function text(parts: readonly AnswerPart[]): string {
  return parts
    .map((part) => {
      if (typeof part === 'string') return part;
      return 'figure' in part ? part.figure : 'quiet' in part ? part.quiet : part.text;
    })
    .join('')
    .replaceAll('\u202f', ' ');
}

function overall(more: Parameters<typeof overrunGroup>[1]) {
  const { key: _, ...figures } = overrunGroup('all', more);
  return { overall: figures };
}

describe('answerOverrun', () => {
  it('longer: by how much with its interval and cars, the stage that made most, and the allowance', () => {
    const { first, second } = say();
    expect(first).toBe('Cars took 20 % longer than estimated (16–24 %, 300 cars).');
    expect(second).toBe(
      'Repair made 67 % of the 400 hours over. With 35 % added to each estimate, 8 of 10 cars would have finished within it.',
    );
  });

  it('an interval about 0: about as long as estimated', () => {
    const { first } = say(overall({ ratio: 1.02, actualMinutes: 40_800 }));
    expect(first).toBe('Cars took about as long as estimated: +2 % (−2 to 6 %, 100 cars).');
  });

  it('shorter: less time, its interval the right way round', () => {
    const { first, second } = say(
      overall({ ratio: 0.9, actualMinutes: 36_000, allowance: -0.04 }),
      [overrunGroup('strip', { actualMinutes: 36_000, ratio: 0.9 })],
    );
    expect(first).toBe('Cars took 10 % less time than estimated (6–14 %, 100 cars).');
    expect(second).toBe('8 of 10 cars finished within 96 % of their estimate.');
  });

  it('one stage over by more than the whole: the others won some back', () => {
    const { second } = say(
      overall({ cars: 300, estimatedMinutes: 40_000, actualMinutes: 41_000, ratio: 1.2 }),
      [
        overrunGroup('repair', { estimatedMinutes: 0, actualMinutes: 3_000, ratio: null }),
        overrunGroup('strip', { estimatedMinutes: 40_000, actualMinutes: 38_000, ratio: 0.95 }),
      ],
    );
    expect(second).toContain('Repair ran 50 hours over; other stages won some of it back.');
  });

  it('few cars: how many, and from when a share is shown', () => {
    const { key: _, ...figures } = smallGroup('all', 3);
    const { first, second } = say({ overall: figures });
    expect(first).toBe('Too few cars yet: 3 cars with an estimate.');
    expect(second).toContain('from 5 cars on');
  });

  it('none: what to do', () => {
    const { key: _, ...figures } = smallGroup('all', 0);
    const { first, second } = say({ overall: figures }, []);
    expect(first).toBe('No car with an estimate was finished in this time.');
    expect(second).toContain('Choose a longer time');
  });
});

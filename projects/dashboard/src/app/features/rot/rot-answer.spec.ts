import type { RotAnswer } from '#shared/contracts/rot';
import type { AgeBand } from '#shared/domain/vocabulary';
import { emptyRotAnswer, rotAnswer, rotZone } from '../../testing/rot-answers';
import type { AnswerPart } from '../../ui/answer/answer';
import { answerRot } from './rot-answer';
import type { RotWords } from './rot-words';

const NAMES: Record<string, string> = { IH: 'Inland Hills', OC: 'Outer Coast' };
const words: RotWords = { regionName: (code) => NAMES[code] ?? code, bodyTypes: [] };

function say(answer: RotAnswer, age: AgeBand = '10-14', more: Partial<RotWords> = {}) {
  const { sentence, second } = answerRot(answer, age, { ...words, ...more });
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

describe('answerRot', () => {
  it('enough cars: the share with interval and cars, the place, the regions with most and least', () => {
    const { first, second } = say(rotAnswer());
    expect(first).toBe('42 % of cars aged 10–14 had rot (37–47 %, 200 cars).');
    expect(second).toBe(
      'Most often in the outer sill, left: 24 %. Outer Coast 60 % (55–65 %, 100 cars), Inland Hills 24 % (19–29 %, 100 cars).',
    );
  });

  it('one body type chosen: the cars are called by it; more than two are cars', () => {
    expect(say(rotAnswer(), '10-14', { bodyTypes: ['hatchback'] }).first).toContain(
      '42 % of hatchbacks aged',
    );
    expect(say(rotAnswer(), '10-14', { bodyTypes: ['van', 'suv'] }).first).toContain(
      'vans and SUVs aged',
    );
    expect(say(rotAnswer(), '10-14', { bodyTypes: ['van', 'suv', 'camper'] }).first).toContain(
      'of cars aged',
    );
  });

  it('a zone on the middle leads: it is named without a side', () => {
    const zones = [rotZone('tailgate', '10-14', 200, { centre: 60 })];
    expect(say(rotAnswer({ zones })).second).toContain('Most often in the tailgate: 30 %.');
  });

  it('no rot at all: says that none was found anywhere', () => {
    const zones = [rotZone('floor', '10-14', 200, { left: 0, right: 0 })];
    expect(say(rotAnswer({ zones })).second).toContain(
      'No rot was found anywhere on these 200 cars.',
    );
  });

  it('one region, a network behind: stands against the network', () => {
    const answer = rotAnswer({ scope: { regions: ['OC'], branches: ['HAV'] } });
    const cells = answer.cells.filter(({ region }) => region === 'OC');
    expect(say({ ...answer, cells }).second).toContain('The whole network: 36 %.');
    expect(say({ ...answer, cells, reference: 'scope' }).second).not.toContain('network');
  });

  it('too few cars: how many, how many with rot, and from when a share is shown', () => {
    const { first, second } = say(rotAnswer(), '20+');
    expect(first).toBe('Too few cars aged 20 and over yet: 4, 2 with rot.');
    expect(second).toContain('from 5 cars on');
  });

  it('no car of the age, none at all: says which, and what to do', () => {
    expect(say(rotAnswer(), '0-4').first).toBe('No cars aged 0–4 in this time.');
    expect(say(rotAnswer(), '0-4').second).toContain('another age');
    expect(say(emptyRotAnswer()).first).toBe('No car was finished in this time.');
    expect(say(emptyRotAnswer()).second).toContain('Choose a longer time');
  });
});

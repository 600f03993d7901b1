import { emptyRotAnswer, rotAnswer } from '../../testing/rot-answers';
import { rotView } from './rot-series';
import type { RotWords } from './rot-words';

const words: RotWords = { regionName: (code) => code, bodyTypes: [] };
const plain = (text: string) => text.replaceAll('\u202f', ' ');

describe('rotView', () => {
  const pictures = rotView(rotAnswer(), '10-14', words).pictures!;

  it('ages, all five: share and cars in words, too few and none said', () => {
    const said = pictures.ages.map(({ name, share, cars }) => plain(`${name} ${share} ${cars}`));
    expect(said).toEqual([
      '0–4 years null no cars',
      '5–9 years 15 % of 200 cars',
      '10–14 years 42 % of 200 cars',
      '15–19 years 34 % of 100 cars',
      '20 years and over null 4 cars, too few',
    ]);
  });

  it('places of the chosen age: one area a side, with its own counts', () => {
    expect(pictures.areas).toHaveLength(6);
    expect(pictures.areas[0]).toMatchObject({
      zone: 'sill_outer',
      side: 'left',
      cars: 200,
      withRot: 48,
      share: 0.24,
    });
  });

  it('the finding of the map: the places with most rot first, with their shares', () => {
    expect(plain(pictures.finding)).toBe(
      'Where cars aged 10–14 had rot most often: outer sill, left 24 %; outer sill, right 21 %; tailgate 9 %; floor, left 7 %; floor, right 6 %.',
    );
  });

  it('too few cars: the map says so, its areas have no share', () => {
    const few = rotView(rotAnswer(), '20+', words).pictures!;
    expect(few.finding).toContain('Too few cars aged 20 and over');
    expect(few.areas.every(({ share }) => share === null)).toBe(true);
  });

  it('no car in the time: no picture', () => {
    expect(rotView(emptyRotAnswer(), '10-14', words).pictures).toBeNull();
  });
});

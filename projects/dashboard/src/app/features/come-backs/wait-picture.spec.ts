import { comeBackRow } from '../../testing/come-back-answers';
import { waitPicture } from './wait-picture';

const TODAY = '2026-02-02';
const daysAgo = (weeks: number): string =>
  new Date(Date.UTC(2026, 1, 2 - weeks * 7)).toISOString().slice(0, 10);

describe('waitPicture', () => {
  it('findings of each gravity: one row each, load-bearing rot as danger, surface rust there with the rest', () => {
    const picture = waitPicture(
      [
        comeBackRow('1', { seenAs: 'bubbling' }),
        comeBackRow('4', { seenAs: 'surface' }),
        comeBackRow('2', { structural: false, workedAs: 'holed' }),
        comeBackRow('3', { structural: false }),
      ],
      TODAY,
      0,
    );
    expect(picture?.data.rows.map(({ key, danger }) => [key, danger])).toEqual([
      ['dangerous', true],
      ['holed', false],
      ['other', false],
    ]);
  });

  it('an owner who was not told: ringed only where it is dangerous', () => {
    const picture = waitPicture(
      [
        comeBackRow('1'),
        comeBackRow('2', { ownerToldOn: '2025-12-01' }),
        comeBackRow('3', { structural: false }),
      ],
      TODAY,
      0,
    );
    expect(picture?.data.rows.map(({ dots }) => dots.map(({ ringed }) => ringed))).toEqual([
      [true, false],
      [false],
    ]);
    expect(picture?.rows[0]?.notTold).toBe(1);
  });

  it('five cars: the middle is said; two findings of one car count as one car', () => {
    const weeks = [1, 2, 30, 40, 50];
    const items = weeks.map((ago, index) =>
      comeBackRow(String(index), { completedOn: daysAgo(ago) }),
    );
    expect(waitPicture(items, TODAY, 0)?.rows[0]).toMatchObject({ median: 30, longest: 50 });
    const oneCar = items.map((item, index) => ({ ...item, jobRef: '1', ref: String(index) }));
    expect(waitPicture(oneCar, TODAY, 0)?.rows[0]?.median).toBeNull();
  });

  it('more down the list than fetched: the note says so', () => {
    expect(waitPicture([comeBackRow('1')], TODAY, 300)?.note).toContain('the first 1 of the list');
  });

  it('nothing left: no picture', () => {
    expect(waitPicture([], TODAY, 0)).toBeUndefined();
  });
});

import { CoverCells } from './cover-cells';

describe('CoverCells', () => {
  it('given cars and claims, adds them up by package, age band and year in service', () => {
    const cells = new CoverCells();
    cells.addCar(7, 1, { daysByYear: [365, 40] });
    cells.addCar(7, 1, { daysByYear: [100] });
    cells.addCar(7, 0, { daysByYear: [10] });
    cells.addClaim(7, 1, 2);
    expect(cells.list()).toEqual([
      { packageId: 7, band: 0, year: 1, days: 10, claims: 0 },
      { packageId: 7, band: 1, year: 1, days: 465, claims: 0 },
      { packageId: 7, band: 1, year: 2, days: 40, claims: 1 },
    ]);
  });

  it('given the cells of others, is as if their cars had been its own, and leaves theirs alone', () => {
    const [one, other, together] = [new CoverCells(), new CoverCells(), new CoverCells()];
    for (const cells of [one, together]) cells.addCar(1, 2, { daysByYear: [365, 3] });
    for (const cells of [other, together]) {
      cells.addCar(1, 2, { daysByYear: [20] });
      cells.addCar(2, 4, { daysByYear: [1] });
      cells.addClaim(2, 4, 1);
    }
    const before = other.list();
    one.addAll(other);
    one.addCar(2, 4, { daysByYear: [9] });
    together.addCar(2, 4, { daysByYear: [9] });
    expect(one.list()).toEqual(together.list());
    expect(other.list()).toEqual(before);
  });
});

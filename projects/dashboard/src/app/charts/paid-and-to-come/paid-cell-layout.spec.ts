import { layOutPaidCell, paidReach } from './paid-cell-layout';

describe('layOutPaidCell', () => {
  it('paid and to come: the one ends where the other begins, the whisker lies about their end', () => {
    const placed = layOutPaidCell({ paid: 600, toCome: 300, giveOrTake: 100 }, 1000);
    expect(placed).toEqual({ paid: 60, toCome: 30, whisker: { from: 80, to: 100 } });
  });

  it('an interval wider than all of it: its whisker does not leave the cell', () => {
    expect(layOutPaidCell({ paid: 10, toCome: 20, giveOrTake: 90 }, 120).whisker).toEqual({
      from: 0,
      to: 100,
    });
  });

  it('nothing to come, or no interval known: no whisker', () => {
    expect(layOutPaidCell({ paid: 10, toCome: 0, giveOrTake: 0 }, 10).whisker).toBeNull();
    expect(layOutPaidCell({ paid: 10, toCome: 5, giveOrTake: null }, 15).whisker).toBeNull();
  });
});

describe('paidReach', () => {
  it('of several rows: the longest with its whisker; of none something to divide by', () => {
    const rows = [
      { paid: 10, toCome: 20, giveOrTake: 5 },
      { paid: 30, toCome: 0, giveOrTake: null },
    ];
    expect(paidReach(rows)).toBe(35);
    expect(paidReach([])).toBe(1);
  });
});

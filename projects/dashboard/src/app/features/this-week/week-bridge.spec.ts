import { marginAnswer } from '../../testing/week-answers';
import { weekBridge } from './week-bridge';

const { bridge } = marginAnswer([]);

describe('weekBridge', () => {
  it('a week: eight rows to the cent, the steps adding up to what was kept', () => {
    const { input, heading } = weekBridge(bridge, 11, 'EUR');
    expect(heading).toBe('From expected to kept, 11 cars');
    expect(input.rows.map(({ label, text }) => `${label} ${text}`)).toEqual([
      'Expected 4,218.34',
      'Price +375.00',
      'Planned labour −309.00',
      'Rot labour −735.00',
      'Product −33.59',
      'Consumables, bought-in −256.00',
      'Fee −22.50',
      'Kept 3,237.25',
    ]);
    const [expected, ...rest] = input.rows.map(({ value }) => value);
    const kept = rest.pop()!;
    expect(rest.reduce((sum, step) => sum + step, expected!)).toBe(kept);
  });

  it('the step of the sentence and the ends stand in 600, losses and gains have their roles', () => {
    const { rows } = weekBridge(bridge, 11, 'EUR').input;
    expect(rows.filter(({ strong }) => strong).map(({ key }) => key)).toEqual([
      'expected',
      'rotLabour',
      'kept',
    ]);
    expect(rows.map(({ role }) => role)).toEqual([
      ...['expected', 'gain', 'loss', 'loss', 'loss', 'loss', 'loss', 'kept'],
    ]);
  });

  it('some cars without estimate or norm: the title says how many are in', () => {
    const part = weekBridge({ ...bridge, cars: 9 }, 11, 'EUR');
    expect(part.heading).toBe('From expected to kept, 9 of 11 cars');
    expect(part.note).toContain('cars without an estimate or a norm are left out');
  });

  it('the text alternative: from, to and the largest step', () => {
    expect(weekBridge(bridge, 11, 'EUR').input.summary).toBe(
      '11 cars: €4,218.34 margin expected, €3,237.25 kept. The largest step: rot labour, which took €735.',
    );
  });
});

import { rotAnswer, rotModel } from '../../testing/rot-answers';
import { modelsView, narrowOrder, shareCell } from './rot-models';

const plain = (text: string) => text.replaceAll('\u202f', ' ');
const view = (more: Parameters<typeof rotAnswer>[0] = {}) =>
  modelsView(rotAnswer(more), '10-14', ({ model }) => ({
    commands: ['/jobs'],
    query: { model },
  }));

describe('modelsView', () => {
  it('models of the age only, the highest steadied first', () => {
    expect(view().rows.map(({ model }) => model)).toEqual(['Tessock', 'Mote', 'Aske']);
  });

  it('a model with too few cars: no share as counted, a steadied one all the same', () => {
    const { columns, rows, all } = view();
    const said = columns.map(({ text }) => plain(text(rows[1]!)));
    expect(said).toEqual(['Velder Mote', '4', '1', 'too few', '38 %', '28–48 %', '']);
    expect(shareCell(rows[1]!, all)).toMatchObject({ counted: null, steadied: 9 / 24, all: 0.42 });
    expect(columns[0]!.link!(rows[1]!)?.query).toEqual({ model: 'Mote' });
  });

  it('the axis: a whole tenth that holds every interval, its ends in the head', () => {
    expect(view().end).toBe(0.7);
    expect(view().columns.at(-1)!.ends!.map(plain)).toEqual(['0', '70 %']);
  });

  it('pooled: said in plain words; one model: that there is nothing to compare', () => {
    expect(view().pooled).toBeNull();
    const alike = { pooled: true, shrunkShare: 0.4 };
    expect(
      view({ models: [rotModel('A', 9, 4, alike), rotModel('B', 8, 3, alike)] }).pooled,
    ).toContain('no more than chance');
    expect(view({ models: [rotModel('A', 9, 4, alike)] }).pooled).toContain('One model only');
  });

  it('a phone: model, steadied share and its range first, nothing left out', () => {
    const keys = narrowOrder(view().columns).map(({ key }) => key);
    expect(keys).toEqual(['model', 'steadied', 'range', 'cars', 'rot', 'counted', 'picture']);
  });
});

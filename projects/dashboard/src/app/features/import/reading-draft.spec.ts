import { importFields } from '#shared/domain/import-fields';
import { importedFile } from '../../testing/import-answers';
import { chooseField, draftOf, isChanged, matchWords } from './reading-draft';

const FIELDS = importFields('jobs', { products: [], packages: [] });
const file = importedFile();

describe('chooseField', () => {
  it('a field for a column left out, fills it and changes no other', () => {
    const draft = chooseField(draftOf(file), 1, 'notes', FIELDS);
    expect(draft.columns.map((column) => column.field)).toEqual(['jobRef', 'notes', 'completedOn']);
    expect(isChanged(draft, file)).toBe(true);
  });

  it('a field that another column fills, takes it from that one', () => {
    const draft = chooseField(draftOf(file), 1, 'completedOn', FIELDS);
    expect(draft.columns.map((column) => column.field)).toEqual(['jobRef', 'completedOn', null]);
  });

  it('the same amount once in full and once in minor units, keeps one of them', () => {
    const inFull = chooseField(draftOf(file), 1, 'invoice.total', FIELDS);
    const both = chooseField(inFull, 2, 'invoice.totalCents', FIELDS);
    expect(both.columns.map((column) => column.field)).toEqual([
      'jobRef',
      null,
      'invoice.totalCents',
    ]);
  });

  it('left out and chosen again, is as it was', () => {
    const out = chooseField(draftOf(file), 0, null, FIELDS);
    expect(isChanged(out, file)).toBe(true);
    expect(isChanged(chooseField(out, 0, 'jobRef', FIELDS), file)).toBe(false);
  });
});

describe('matchWords', () => {
  const [named, none, chosen] = file.columns;

  it('of a column, says whether its name, a person before or a person now chose its field', () => {
    expect(matchWords(named!, 'jobRef')).toBe('by its name');
    expect(matchWords(none!, null)).toBe('no field has this name');
    expect(matchWords(chosen!, 'completedOn')).toBe('as chosen for this branch before');
    expect(matchWords(named!, 'notes')).toBe('chosen just now');
    expect(matchWords(named!, null)).toBe('left out just now');
  });
});

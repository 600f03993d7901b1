import { fieldProblems } from './field-problems';

const of = (path: string, message: string) =>
  fieldProblems({ status: 422, sentence: '', fields: [{ path, message }] });

describe('fieldProblems', () => {
  it('of a rule about a day, names the day as the form does', () => {
    expect(of('/decidedOn', 'is before madeOn (2026-01-10)')).toEqual({
      decidedOn: 'The day it was decided is before the day it was made (2026-01-10).',
    });
  });

  it('of a rule that stands by itself, says it alone', () => {
    expect(of('/paidOn', 'a claim is paid only once it is decided')).toEqual({
      paidOn: 'A claim is paid only once it is decided.',
    });
  });

  it('of the cost, marks the field that is typed', () => {
    expect(Object.keys(of('/costCents', 'is too large'))).toEqual(['cost']);
  });

  it('of a field the form has not, marks nothing', () => {
    expect(of('/jobRef', 'is not a job of this branch')).toEqual({});
  });
});

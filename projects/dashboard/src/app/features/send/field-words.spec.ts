import type { DraftDocument } from './draft-document';
import { fieldName, messageWords, problemSentence } from './field-words';

const NAME = (code: string): string => (code === 'CW1' ? 'Cavity wax' : code);
const document: DraftDocument = {
  findings: [
    { ref: 'floor/left/1', zone: 'floor', side: 'left' },
    { ref: 'sill_inner/left/1', zone: 'sill_inner', side: 'left' },
  ],
};

describe('fieldName', () => {
  it.each([
    ['/vehicle/make', 'The make'],
    ['/actual/stages/repair', 'Stage repair'],
    ['/estimate/stages/dry', 'The estimate of stage dry'],
    ['/products/CW1/ml', 'Product, Cavity wax'],
    ['/findings/sill_inner~1left~11/workedAs', 'Finding 2, sill, inner, left, "worked as"'],
    ['/agreedExtras/0/on', 'Agreed beyond the quote, 1: the day'],
    ['/consumables/trim_clip/quantity', 'Consumables, trim clips'],
    ['/checks/driedOut', 'The check "cavities dry before product"'],
    ['/something/else', 'Something'],
  ])('of %s, given the draft, is %s', (path, name) => {
    expect(fieldName(document, path, NAME)).toBe(name);
  });
});

describe('problemSentence', () => {
  it('of a rule, given its own names for fields, speaks in the form’s', () => {
    expect(messageWords('is after completedOn (2026-02-01)')).toBe(
      'is after the day finished (2026-02-01)',
    );
    expect(problemSentence(document, { path: '/package', message: 'is required' }, NAME)).toBe(
      'The package is still missing.',
    );
    expect(problemSentence(document, { path: '/package', message: 'not one of ours' }, NAME)).toBe(
      'The package: not one of ours.',
    );
  });
});

import type { ImportedFile } from '#shared/contracts/imports';
import { importedFile } from '../../testing/import-answers';
import type { AnswerPart } from '../../ui/answer/answer';
import { answerImport } from './import-answer';

const NOTHING = { created: 0, replaced: 0, unchanged: 0, refused: 0 };

function told(change: Partial<ImportedFile>): { first: string; second: string } {
  const { sentence, second } = answerImport(importedFile(change), (field) => `«${field}»`);
  return { first: text(sentence), second: text(second) };
}

function text(parts: readonly AnswerPart[]): string {
  return parts
    .map((part) => (typeof part === 'string' ? part : 'figure' in part ? part.figure : ''))
    .join('');
}

describe('answerImport', () => {
  it('checked, counts what each row would do and says that nothing is written', () => {
    const { first, second } = told({});
    expect(first).toBe('1,204 rows: 1,150 new, 31 changed, 12 unchanged, 11 refused.');
    expect(second).toContain('Nothing is written yet. The refused rows stay out');
  });

  it('checked and all as recorded, says that there is nothing to write', () => {
    const counts = { rows: 1, new: 0, changed: 0, unchanged: 1, refused: 0 };
    const { first, second } = told({ counts });
    expect(first).toBe('1 row: 0 new, 0 changed, 1 unchanged, 0 refused.');
    expect(second).toBe('There is nothing to write.');
  });

  it('checked without a field it needs, says that first, by the name people know', () => {
    const { first, second } = told({ missingFields: ['package', 'vehicle.make'] });
    expect(first).toBe('No column gives: «package» and «vehicle.make».');
    expect(second).toContain('Nothing is written yet');
  });

  it('being checked or written, leaves the count to the progress', () => {
    expect(told({ state: 'checking' }).second).toBe('Nothing is written yet.');
    expect(told({ state: 'writing' }).second).toContain('What is written stays');
  });

  it('written, says what is new and changed, and what was refused', () => {
    const written = { created: 1150, replaced: 31, unchanged: 12, refused: 11 };
    const { first, second } = told({ state: 'done', written });
    expect(first).toBe('1,181 cars written: 1,150 new, 31 changed.');
    expect(second).toContain('12 rows were as recorded already.');
    expect(second).toContain('11 rows were refused and not written');
  });

  it('written a second time, says that nothing had to be', () => {
    const written = { ...NOTHING, unchanged: 4 };
    expect(told({ state: 'done', written }).first).toBe('Nothing had to be written.');
  });

  it('stopped halfway, says what stays and what is missing', () => {
    const { first, second } = told({
      state: 'cancelled',
      written: { ...NOTHING, created: 1000, replaced: 1 },
    });
    expect(first).toBe('It was stopped: 1,001 cars are written and stay, 180 are not.');
    expect(second).toContain('nothing is written twice');
  });

  it('stopped before the first, says that nothing was written', () => {
    const progress = { done: 0, of: null };
    const { first, second } = told({ state: 'stopped', written: NOTHING, progress });
    expect(first).toBe('The server went down in between; nothing was written.');
    expect(second).toContain('Check it again');
  });

  it('unreadable, says why and how to save it', () => {
    const { second } = told({ state: 'failed', problem: 'It holds no rows' });
    expect(second).toBe(
      'It holds no rows. Nothing is written. Save it again as CSV (UTF-8) and send it.',
    );
  });

  it('of claims, calls them claims', () => {
    const written = { ...NOTHING, created: 1 };
    expect(told({ state: 'done', kind: 'claims', written }).first).toContain('1 claim written');
  });
});

import { formatDate } from '../../ui/format';
import { differencesOf } from './claim-differences';
import { emptyClaim } from './typed-claim';

const RECORD = { ...emptyClaim('2026-02-02'), zone: 'floor', cause: 'damage', side: 'left' };

describe('differencesOf', () => {
  it('given the same, has none', () => {
    expect(differencesOf(RECORD, { ...RECORD, note: ' ' })).toEqual([]);
  });

  it('given another decision and day, says both sides in words', () => {
    const typed = { ...RECORD, decision: 'accepted', decidedOn: '2026-02-01' };
    expect(differencesOf(RECORD, typed)).toEqual([
      { field: 'Decision', record: 'open', form: 'accepted' },
      { field: 'Decided on', record: 'nothing', form: formatDate('2026-02-01') },
    ]);
  });

  it('given another place and cause, names them as the trade does', () => {
    const typed = { ...RECORD, zone: 'sill_outer', side: 'right', cause: 'missed_area' };
    expect(differencesOf(RECORD, typed).map(({ form }) => form)).toEqual([
      'sill, outer',
      'right',
      'missed area',
    ]);
  });
});

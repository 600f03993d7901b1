/**
 * How the cells of a field are written. `amount`: money as people write it, with up to two decimals; `cents`: the same in whole
 * minor units; `minutes`: whole minutes, or hours and minutes ("1:45", "1h45"); `month`: a month, or any day in it.
 */
export type ImportFieldKind =
  | 'text'
  | 'reference'
  | 'date'
  | 'month'
  | 'whole'
  | 'minutes'
  | 'amount'
  | 'cents'
  | 'decimal'
  | 'choice'
  | 'yesno';

/** What a column of a file may fill. */
export interface ImportField {
  /** Its name: as in the JSON of a job or claim wherever it is one field there. */
  field: string;
  label: string;
  hint: string;
  /** Whether a new job or claim cannot do without it. */
  required: boolean;
  kind: ImportFieldKind;
  /** Other headings it is known by. */
  names: readonly string[];
  /** The words of a `choice`; a package may be given by its name as well. */
  choices?: readonly string[];
  /** What it fills: two columns may not fill the same, such as a price in full and one in minor units. */
  fills: string;
}

/** What an empty cell and an absent column mean: for whoever prepares a file. */
export const EMPTY_AND_ABSENT =
  'An empty cell in a column that is there empties the field; what no column fills stays as it is recorded.';

/** The last column of a file of refused rows; left out when the file is sent again. */
export const WHY_REFUSED = 'why refused';

/** A heading as it is compared: without regard to case, spaces, dots and underscores. */
export function headingKey(heading: string): string {
  return heading
    .normalize('NFC')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]/gu, '')
    .slice(0, 200);
}

type Given = Pick<ImportField, 'field' | 'label' | 'kind'> & Partial<ImportField>;

/** A field with what most fields have in common. */
export function importField(given: Given): ImportField {
  return { hint: HINTS[given.kind], required: false, names: [], fills: given.field, ...given };
}

const HINTS: Record<ImportFieldKind, string> = {
  text: 'Text.',
  reference: 'Up to 64 characters; capital and small letters differ.',
  date: 'A day, such as 2026-01-28 or 28.01.2026.',
  month: 'A month, such as 2009-05 or 05/2009, or any day in it.',
  whole: 'A whole number.',
  minutes: 'Whole minutes, or hours and minutes such as 1:45.',
  amount: 'An amount before tax, with up to two decimals.',
  cents: 'An amount before tax in whole minor units, such as cents.',
  decimal: 'A number.',
  choice: 'One of the words listed.',
  yesno: 'yes or no (also y, n, 1, 0, true, false).',
};

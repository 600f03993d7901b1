import type { ReadingOptions } from '#shared/contracts/imports';

/** One way in which files differ, and the choices for it. */
export interface ReadingChoice {
  readonly name: keyof ReadingOptions;
  readonly label: string;
  readonly choices: readonly { readonly value: string; readonly words: string }[];
}

/** What a file can differ in, in the order in which it shows. */
export const READING_CHOICES: readonly ReadingChoice[] = [
  {
    name: 'delimiter',
    label: 'Between cells',
    choices: [
      { value: ',', words: 'comma' },
      { value: ';', words: 'semicolon' },
      { value: '\t', words: 'tab' },
      { value: '|', words: 'bar' },
    ],
  },
  {
    name: 'encoding',
    label: 'Letters',
    choices: [
      { value: 'utf-8', words: 'UTF-8' },
      { value: 'windows-1252', words: 'Windows-1252' },
    ],
  },
  {
    name: 'decimal',
    label: 'Decimals',
    choices: [
      { value: '.', words: 'point, 1.5' },
      { value: ',', words: 'comma, 1,5' },
    ],
  },
  {
    name: 'dateOrder',
    label: 'Dates',
    choices: [
      { value: 'ymd', words: 'year, month, day' },
      { value: 'dmy', words: 'day, month, year' },
      { value: 'mdy', words: 'month, day, year' },
    ],
  },
];

import type { ImportedFile } from '#shared/contracts/imports';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount, formatCounted, formatList } from '../../ui/format';
import { countOf, hasBegun, toWrite, writtenOf } from './import-words';

/** What a file would change or has changed, and what to do next. */
export interface ImportSentences {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
}

type Told = Pick<
  ImportedFile,
  'kind' | 'fileName' | 'state' | 'counts' | 'progress' | 'written' | 'missingFields' | 'problem'
>;

/** Says where a file stands; `labelOf` names a field. */
export function answerImport(file: Told, labelOf: (field: string) => string): ImportSentences {
  switch (file.state) {
    case 'checking':
      return {
        sentence: [`“${file.fileName}” is being checked.`],
        second: ['Nothing is written yet.'],
      };
    case 'ready':
      return file.missingFields.length > 0 ? incomplete(file, labelOf) : ready(file);
    case 'writing':
      return {
        sentence: [`“${file.fileName}” is being written.`],
        second: ['What is written stays, also when you stop. You may leave this page.'],
      };
    case 'done':
      return done(file);
    case 'cancelled':
      return halfway(file, 'It was stopped');
    case 'stopped':
      return halfway(file, 'The server went down in between');
    case 'failed':
      return {
        sentence: ['This file could not be read.'],
        second: [
          [
            stop(file.problem ?? ''),
            writtenSoFar(file),
            'Save it again as CSV (UTF-8) and send it.',
          ]
            .filter(Boolean)
            .join(' '),
        ],
      };
  }
}

function incomplete(file: Told, labelOf: (field: string) => string): ImportSentences {
  const labels = file.missingFields.map(labelOf);
  return {
    sentence: [`No column gives: ${formatList(labels)}.`],
    second: [
      `Choose below which ${labels.length === 1 ? 'column does' : 'columns do'}, then check the file again. Nothing is written yet.`,
    ],
  };
}

function ready(file: Told): ImportSentences {
  const { rows, unchanged, refused } = file.counts;
  const parts = [
    `${formatCount(file.counts.new)} new`,
    `${formatCount(file.counts.changed)} changed`,
    `${formatCount(unchanged)} unchanged`,
    `${formatCount(refused)} refused`,
  ];
  const second = [
    toWrite(file) === 0 ? 'There is nothing to write.' : 'Nothing is written yet.',
    refused > 0
      ? `The refused ${refused === 1 ? 'row stays' : 'rows stay'} out: mend ${refused === 1 ? 'it' : 'them'} and send ${refused === 1 ? 'it' : 'them'} again.`
      : '',
  ];
  return {
    sentence: [
      { figure: formatCount(rows) },
      `${rows === 1 ? ' row: ' : ' rows: '}${parts.join(', ')}.`,
    ],
    second: [second.filter(Boolean).join(' ')],
  };
}

function done(file: Told): ImportSentences {
  const { created, replaced, unchanged } = file.written;
  const refused = file.written.refused;
  const rest = [
    unchanged > 0 ? `${formatCounted(unchanged, 'row was', 'rows were')} as recorded already.` : '',
    refused > 0
      ? `${formatCounted(refused, 'row was', 'rows were')} refused and not written: fetch the refused rows, mend them and send them again.`
      : '',
  ];
  const second = [rest.filter(Boolean).join(' ')].filter(Boolean);
  if (created + replaced === 0) {
    return { sentence: ['Nothing had to be written.'], second };
  }
  return {
    sentence: [
      { figure: formatCount(created + replaced) },
      `${countOf(file.kind, created + replaced).replace(/^\S+/, '')} written: ${formatCount(created)} new, ${formatCount(replaced)} changed.`,
    ],
    second,
  };
}

function halfway(file: Told, why: string): ImportSentences {
  const written = writtenOf(file);
  if (written === 0) {
    return {
      sentence: [`${why}; nothing was written.`],
      second: [
        hasBegun(file)
          ? 'Write the rest, or leave it: nothing is written twice.'
          : 'Check it again to see what it would change, or send another file.',
      ],
    };
  }
  const left = Math.max(0, toWrite(file) - written);
  return {
    sentence: [
      `${why}: `,
      { figure: formatCount(written) },
      `${countOf(file.kind, written).replace(/^\S+/, '')} ${written === 1 ? 'is' : 'are'} written and ${written === 1 ? 'stays' : 'stay'}, ${formatCount(left)} ${left === 1 ? 'is' : 'are'} not.`,
    ],
    second: ['Write the rest, or leave it: nothing is written twice.'],
  };
}

function writtenSoFar(file: Told): string {
  const written = writtenOf(file);
  return written === 0
    ? 'Nothing is written.'
    : `${countOf(file.kind, written)} of it ${written === 1 ? 'is' : 'are'} written and ${written === 1 ? 'stays' : 'stay'}.`;
}

function stop(text: string): string {
  return text === '' || /[.!?]$/.test(text) ? text : `${text}.`;
}

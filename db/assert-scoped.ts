import { HANGING_TABLES, SCOPED_TABLES } from './tables';

/** A statement that reads rows of a branch past the scope. Never shown to a caller: it is a defect of ours. */
export class UnscopedRead extends Error {}

/** Literals and comments, which name nothing; else a name (quoted or not) or a sign. */
const TOKEN =
  /'(?:[^']|'')*'|--[^\n]*|\/\*[\s\S]*?\*\/|[`"[](?<quoted>[^`"\]]+)[`"\]]|(?<word>\w+|[(),.])/g;
const OPENS_A_LIST = new Set(['from', 'join', 'update', 'into']);
const ENDS_A_LIST = new Set(
  'select where group having order limit window union except intersect set values'.split(' '),
);
const SCOPED = new Set<string>(SCOPED_TABLES);
const HANGING = new Set<string>(HANGING_TABLES);

/** Throws when a statement names a scoped table as a source of rows, or a hanging one other than by joining it to its row. */
export function assertScoped(text: string): void {
  for (const { name, after } of sourcesOf(text)) {
    if (SCOPED.has(name)) throw new UnscopedRead(`a statement reads ${name} outside its scope`);
    if (HANGING.has(name) && after !== 'join') {
      throw new UnscopedRead(`a statement reads ${name} without joining it to its row`);
    }
  }
}

/** The tables that a statement takes rows from, each with the word or sign that opened its place. */
function sourcesOf(text: string): { name: string; after: string }[] {
  const sources: { name: string; after: string }[] = [];
  const tokens = [...text.matchAll(TOKEN)].flatMap(({ groups }) =>
    groups?.['quoted'] !== undefined
      ? { name: groups['quoted'].toLowerCase(), quoted: true }
      : groups?.['word'] !== undefined
        ? { name: groups['word'].toLowerCase(), quoted: false }
        : [],
  );
  const around: (string | undefined)[] = [];
  /** The list of tables we are in, by what opened it; and whether a table is due now. */
  let list: string | undefined;
  let due: string | undefined;
  tokens.forEach(({ name, quoted }, index) => {
    if (!quoted && OPENS_A_LIST.has(name)) list = due = name;
    else if (!quoted && ENDS_A_LIST.has(name)) list = due = undefined;
    else if (name === '(') {
      around.push(list);
      list = due;
    } else if (name === ')') {
      list = around.pop();
      due = undefined;
    } else if (name === ',') due = list && ',';
    else if (due !== undefined && name !== '.' && tokens[index + 1]?.name !== '.') {
      sources.push({ name, after: due });
      due = undefined;
    }
  });
  return sources;
}

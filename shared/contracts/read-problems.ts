import type * as z from 'zod';
import type { FieldProblem } from './fields';

/** Turns what zod found into problems with JSON pointers below `root` and sentences a person can act on. */
export function problemsOf(error: z.core.$ZodError, root = ''): FieldProblem[] {
  return error.issues.flatMap((issue) => {
    const path = root + issue.path.map(pointerPart).join('');
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => ({
        path: path + pointerPart(key),
        message: 'is not a known field',
      }));
    }
    return [{ path, message: sentenceOf(issue) }];
  });
}

/** One step of a JSON pointer (RFC 6901). */
export function pointerPart(part: PropertyKey): string {
  return `/${String(part).replaceAll('~', '~0').replaceAll('/', '~1')}`;
}

/** Adds problems, leaving out what is already said of the same field in the same words. */
export function joined(...lists: readonly (readonly FieldProblem[])[]): FieldProblem[] {
  const seen = new Set<string>();
  return lists.flat().filter(({ path, message }) => {
    const key = `${path}\n${message}`;
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
}

const TYPES: Record<string, string> = {
  string: 'text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
  object: 'an object',
  array: 'a list',
};

function sentenceOf(issue: z.core.$ZodIssue): string {
  switch (issue.code) {
    case 'invalid_type':
      if (issue.message.endsWith('received undefined')) return 'is required';
      return `must be ${TYPES[issue.expected] ?? issue.expected}`;
    case 'invalid_value':
      if (issue.message.endsWith('received undefined')) return 'is required';
      return issue.values.length === 1
        ? `must be ${JSON.stringify(issue.values[0])}`
        : `must be one of ${issue.values.map(String).join(', ')}`;
    case 'too_small':
      return issue.message.startsWith('Too small')
        ? `must be at least ${issue.minimum}${unitOf(issue.origin)}`
        : issue.message;
    case 'too_big':
      return issue.message.startsWith('Too big')
        ? `must be at most ${issue.maximum}${unitOf(issue.origin)}`
        : issue.message;
    case 'invalid_union':
      return kindAsked(issue) ?? issue.message;
    default:
      return issue.message;
  }
}

/** Of a body that is one of several kinds, told apart by a word in it: which words there are. */
function kindAsked(issue: z.core.$ZodIssueInvalidUnion): string | undefined {
  if (!('options' in issue) || !Array.isArray(issue.options)) return undefined;
  return `must be one of ${issue.options.map(String).join(', ')}`;
}

function unitOf(origin: string): string {
  if (origin === 'string') return ' characters long';
  if (origin === 'array') return ' entries long';
  return '';
}

import { readFileSync } from 'node:fs';
import path from 'node:path';
import { root } from '../support/project-files';

/** The push that the README shows, read from its curl command. */
export interface ReadmePush {
  method: string;
  /** Path and query, without the host. */
  path: string;
  headers: Record<string, string>;
  /** The body as text, completed on a day. */
  bodyOn: (day: string) => string;
}

/** Takes the README's curl command apart as a shell would: words, single and double quotes, lines going on. */
export function readmePush(
  markdown = readFileSync(path.join(root, 'README.md'), 'utf8'),
): ReadmePush {
  const block = [...markdown.matchAll(/```sh\n([\s\S]*?)```/g)]
    .map(([, text]) => text ?? '')
    .find((text) => text.includes('curl -X PUT'));
  if (!block) throw new Error('the README shows no push with curl');
  const words = shellWords(block.slice(block.indexOf('curl')).trim());
  const after = (option: string): string[] =>
    words.flatMap((word, index) => (words[index - 1] === option ? [word] : []));
  const address = new URL(words.find((word) => /^https?:/.test(word)) ?? '');
  const [body = ''] = after('-d');
  return {
    method: after('-X')[0] ?? '',
    path: address.pathname + address.search,
    headers: Object.fromEntries(
      after('-H').map((line) => [line.slice(0, line.indexOf(':')), line.replace(/^[^:]*: */, '')]),
    ),
    bodyOn: (day) => body.replaceAll('$day', day),
  };
}

/** Splits a command into its words. Variables stay as they are written. */
function shellWords(command: string): string[] {
  const pieces = /\\\n|'([^']*)'|"([^"]*)"|(\s+)|([^\s'"\\]+)/g;
  const words: string[] = [];
  let open = '';
  for (const [whole, single, double, gap, plain] of command.matchAll(pieces)) {
    if (gap !== undefined || whole === '\\\n') {
      if (open) words.push(open);
      open = '';
    } else {
      open += single ?? double ?? plain ?? '';
    }
  }
  return open ? [...words, open] : words;
}

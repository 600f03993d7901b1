import { existsSync, readdirSync, statSync } from 'node:fs';
import path from 'node:path';
import { MADE_BY_RUNNING } from '../support/project-files';

/** A path, command or setting that a document names. */
export interface Named {
  kind: 'path' | 'script';
  /** A path from the project's root (`*` and `<name>` stand for any one name), or the name of an npm script. */
  name: string;
}

/**
 * What a Markdown document names of the project: the targets of its relative links and pictures, words in code that begin with
 * one of the project's own folders or aliases, and `npm run` scripts.
 */
export function namedIn(markdown: string, file: string, folders: readonly string[]): Named[] {
  const links = [...markdown.matchAll(/\]\(([^)\s]+)\)|\b(?:src|href)="([^"]+)"/g)]
    .map((match) => match[1] ?? match[2] ?? '')
    .filter((target) => target !== '' && !/^([a-z]+:|#|\/)/.test(target))
    .map((target) => path.posix.join(path.posix.dirname(file), target.replace(/#.*$/, '')));
  const words = codeIn(markdown)
    .flatMap((code) => code.split(/[\s`'"(),;:=|]+/))
    .map((word) => word.replace(/^#/, '').replace(/\.$/, ''))
    .filter((word) => folders.some((folder) => word.startsWith(`${folder}/`)));
  const paths = [...links, ...words]
    .map((name) => name.replace(/\/$/, ''))
    .filter(
      (name) => !MADE_BY_RUNNING.some((made) => name === made || name.startsWith(`${made}/`)),
    );
  const scripts = [...markdown.matchAll(/\bnpm run ([a-z][\w:-]*)/g)].map(
    (match) => match[1] ?? '',
  );
  return [
    ...[...new Set(paths)].map((name): Named => ({ kind: 'path', name })),
    ...[...new Set(scripts)].map((name): Named => ({ kind: 'script', name })),
  ];
}

/** Whether a named path is there; one of an alias stands without its extension. */
export function isThere(name: string, root: string): boolean {
  const parts = name.replace(/<[^>]*>|…/g, '*').split('/');
  const last = parts.pop() ?? '';
  const inside = parts.reduce<string[]>((places, part) => below(places, part), [root]);
  return [last, `${last}.ts`, `${last}.mjs`].some((ending) => below(inside, ending).length > 0);
}

function below(places: readonly string[], part: string): string[] {
  if (!part.includes('*')) {
    return places.map((place) => path.join(place, part)).filter((place) => existsSync(place));
  }
  const pattern = new RegExp(
    `^${part
      .split('*')
      .map((text) => text.replace(/[.*+?^${}()|[\]\\]/g, '\\$&'))
      .join('.*')}$`,
  );
  return places
    .filter((place) => existsSync(place) && statSync(place).isDirectory())
    .flatMap((place) =>
      readdirSync(place)
        .filter((entry) => pattern.test(entry))
        .map((entry) => path.join(place, entry)),
    );
}

function codeIn(markdown: string): string[] {
  const fences = [...markdown.matchAll(/^ *```[^\n]*\n([\s\S]*?)^ *```/gm)].map(
    (match) => match[1],
  );
  const rest = markdown.replace(/^ *```[^\n]*\n[\s\S]*?^ *```/gm, '');
  const spans = [...rest.matchAll(/`([^`\n]+)`/g)].map((match) => match[1]);
  return [...fences, ...spans].map((code) => code ?? '');
}

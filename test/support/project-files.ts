import { readdirSync } from 'node:fs';
import path from 'node:path';

/** The project's folder. */
export const root = path.join(__dirname, '../..');

/** What is no source: made by installing, building, running or testing. */
export const MADE_BY_RUNNING = [
  '.git',
  'node_modules',
  'dist',
  'data',
  'coverage',
  '.angular',
  'test/output',
];

/** Every source file of the project, by its path from the root, in order. */
export function projectFiles(folder = ''): string[] {
  return readdirSync(path.join(root, folder), { withFileTypes: true })
    .map((entry) => ({ entry, name: path.posix.join(folder, entry.name) }))
    .filter(({ name }) => !MADE_BY_RUNNING.includes(name))
    .flatMap(({ entry, name }) => (entry.isDirectory() ? projectFiles(name) : [name]))
    .sort();
}

import path from 'node:path';
import { root } from './project-files';

/** What Node is given to run a program of the server (`server/main`): as built where `npm test` has just built it, from source otherwise. */
export function programArgs(program: string): string[] {
  return process.env['UNDERSEAM_BUILT'] === 'on'
    ? [path.join(root, 'dist', `${program}.js`)]
    : ['--import', 'tsx', '--conditions=underseam-source', path.join(root, `${program}.ts`)];
}

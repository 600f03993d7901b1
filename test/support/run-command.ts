import { spawnSync } from 'node:child_process';
import { programArgs } from './program';
import { root } from './project-files';

/** How a command line ended. */
export interface Ended {
  code: number | null;
  out: string;
  error: string;
}

/** Runs one of the commands of server/commands as `npm run` does. */
export function runCommandLine(
  name: string,
  args: readonly string[],
  env: Readonly<Record<string, string>> = {},
): Ended {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    [...programArgs(`server/commands/${name}`), ...args],
    { cwd: root, encoding: 'utf8', env: { ...process.env, ...env } },
  );
  return { code: status, out: stdout, error: stderr };
}

import { spawnSync } from 'node:child_process';
import path from 'node:path';
import { root } from './project-files';

/** How a command line ended. */
export interface Ended {
  code: number | null;
  out: string;
  error: string;
}

/** Runs one of the commands of server/commands from source, as `npm run` does from the build. */
export function runCommandLine(
  name: string,
  args: readonly string[],
  env: Readonly<Record<string, string>> = {},
): Ended {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    [
      path.join(root, 'node_modules/tsx/dist/cli.mjs'),
      '--conditions=underseam-source',
      path.join(root, `server/commands/${name}.ts`),
      ...args,
    ],
    { cwd: root, encoding: 'utf8', env: { ...process.env, ...env } },
  );
  return { code: status, out: stdout, error: stderr };
}

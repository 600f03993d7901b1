import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { serve, type Served } from '../bench/serve';
import { root } from '../support/project-files';
import { MONDAY_MORNING } from './served-demo';

/** The one person of an empty network: head office. */
export const FIRST = { email: 'first@network.example', password: 'nobody-was-here-before' };

/** Serves a network on its first day: no branch, no car, one person of head office. */
export async function serveEmpty(): Promise<Served> {
  const folder = mkdtempSync(path.join(tmpdir(), 'underseam-empty-'));
  const served = await serve(folder, { UNDERSEAM_DEMO: 'off', UNDERSEAM_NOW: MONDAY_MORNING });
  addFirstPerson(folder);
  return {
    url: served.url,
    stop: async () => {
      await served.stop();
      rmSync(folder, { recursive: true, force: true });
    },
  };
}

/** As the README says it is done, beside the running server. */
function addFirstPerson(data: string): void {
  const ended = spawnSync(
    process.execPath,
    [
      path.join(root, 'server/commands/run.mjs'),
      'person-add',
      ...['--email', FIRST.email, '--name', 'Tove Grindskar', '--role', 'head_office'],
    ],
    {
      encoding: 'utf8',
      env: { ...process.env, UNDERSEAM_DATA: data, UNDERSEAM_PASSWORD: FIRST.password },
    },
  );
  if (ended.status !== 0) throw new Error(ended.stderr);
}

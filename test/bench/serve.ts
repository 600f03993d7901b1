import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';

/** The built server as a process of its own on a data folder. */
export interface Served {
  url: string;
  pid?: number | undefined;
  stop: () => Promise<void>;
}

/** Starts the built server and waits until it says where it serves. */
export async function serve(
  folder: string,
  environment: Record<string, string> = {},
): Promise<Served> {
  const child: ChildProcess = spawn(
    process.execPath,
    [join(__dirname, '..', '..', 'dist', 'server', 'main.js')],
    {
      env: {
        ...process.env,
        PORT: '0',
        UNDERSEAM_DATA: folder,
        UNDERSEAM_DEMO: 'off',
        LOG_LEVEL: 'warn',
        ...environment,
      },
      stdio: ['ignore', 'pipe', 'inherit'],
    },
  );
  let said = '';
  const url = await new Promise<string>((resolve, reject) => {
    child.stdout?.on('data', (chunk: Buffer) => {
      said += chunk.toString();
      const found = /serves (http:\/\/\S+)/.exec(said);
      if (found?.[1]) resolve(found[1]);
    });
    child.once('exit', () => reject(new Error(`the server ended: ${said}`)));
  });
  // A bench that fails must not leave its server behind.
  const end = (): boolean => child.kill('SIGKILL');
  process.once('exit', end);
  return {
    url,
    pid: child.pid,
    stop: async () => {
      process.off('exit', end);
      if (child.exitCode !== null) return;
      child.kill('SIGTERM');
      await once(child, 'exit');
    },
  };
}

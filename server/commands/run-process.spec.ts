import { spawn } from 'node:child_process';
import path from 'node:path';
import { pathToFileURL } from 'node:url';

/** Other programs are run here, which a busy machine may keep waiting. */
jest.setTimeout(60_000);

const runner = JSON.stringify(pathToFileURL(path.join(__dirname, 'run-process.mjs')).href);

/** Runs a program under `runHere`, sends the outer process a signal once it is ready, and answers the outer one's exit code. */
function signalled(program: string, signal: NodeJS.Signals): Promise<number | null> {
  const outer = spawn(process.execPath, [
    '--input-type=module',
    '-e',
    `import { runHere } from ${runner};
     const { code } = await runHere(process.execPath, ['-e', ${JSON.stringify(program)}]);
     process.exit(code);`,
  ]);
  outer.stdout.once('data', () => outer.kill(signal));
  return new Promise((resolve) => outer.on('close', resolve));
}

const READY = `setInterval(() => {}, 1000); console.log('ready');`;

describe('runHere', () => {
  it.each<NodeJS.Signals>(['SIGTERM', 'SIGINT', 'SIGHUP'])(
    'given %s, hands it on and ends with the code of the program',
    async (signal) => {
      const program = `process.on('${signal}', () => process.exit(7)); ${READY}`;
      expect(await signalled(program, signal)).toBe(7);
    },
  );

  it('given a program that a signal ends, ends as a shell would', async () => {
    expect(await signalled(READY, 'SIGTERM')).toBe(128 + 15);
  });
});

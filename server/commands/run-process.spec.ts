import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';

/** Other programs are run here, which a busy machine may keep waiting. */
jest.setTimeout(60_000);

const runner = JSON.stringify(pathToFileURL(path.join(__dirname, 'run-process.mjs')).href);

/** Runs a program under `runHere`, sends the outer process a signal once it is ready, and answers the outer one's exit code. */
function signalled(program: string, signal: NodeJS.Signals): Promise<number | null> {
  const outer = spawn(process.execPath, ['--input-type=module', '-e', outerProgram(program)]);
  outer.stdout.once('data', () => outer.kill(signal));
  return new Promise((resolve) => outer.on('close', resolve));
}

function outerProgram(program: string): string {
  return `import { runHere } from ${runner};
    const { code } = await runHere(process.execPath, ['-e', ${JSON.stringify(program)}]);
    process.exit(code);`;
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

  it('given npm, whose shell alone a signal ends, ends the program too', async () => {
    const folder = mkdtempSync(path.join(tmpdir(), 'shell-'));
    const ended = path.join(folder, 'ended');
    const program = `process.on('SIGTERM', () => {
      require('node:fs').writeFileSync(${JSON.stringify(ended)}, '');
      process.exit();
    }); ${READY}`;
    writeFileSync(path.join(folder, 'outer.mjs'), outerProgram(program));
    const script = `'${process.execPath}' '${path.join(folder, 'outer.mjs')}'; true`;
    const shell = spawn('sh', ['-c', script], {
      env: { ...process.env, npm_lifecycle_event: 'start' },
    });
    await new Promise((resolve) => shell.stdout.once('data', resolve));
    shell.kill('SIGTERM');
    while (!existsSync(ended)) await new Promise((resolve) => setTimeout(resolve, 50));
    rmSync(folder, { recursive: true });
  });

  it('given a program that a signal ends, ends as a shell would', async () => {
    expect(await signalled(READY, 'SIGTERM')).toBe(128 + 15);
  });
});

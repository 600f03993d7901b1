import { runAside, runHere } from '../../server/commands/run-process.mjs';

/** @typedef {{ name: string, args: string[], env?: Record<string, string> }} Program a Node program and its arguments */
/** @typedef {{ name: string, run: () => Promise<{ code: number, output: string, seconds: number }> }} Work */
/** @typedef {Program | Work} Step */

/**
 * Runs steps side by side, at most so many at once; prints each one's time, and all it wrote when it failed.
 * @param {Step[]} steps
 */
export async function runAtOnce(steps, atOnce) {
  const waiting = [...steps];
  const ended = [];
  const work = async () => {
    for (let step = waiting.shift(); step; step = waiting.shift()) {
      const { code, output, seconds } = await ('run' in step
        ? step.run()
        : runAside(process.execPath, step.args, step.env));
      if (code !== 0) process.stdout.write(output);
      ended.push(tell(step.name, code, seconds));
    }
  };
  await Promise.all(Array.from({ length: atOnce }, work));
  return ended;
}

/** Runs one step and lets it write as it goes. */
export async function runAloud({ name, args, env }) {
  console.log(`\n── ${name}`);
  const { code, seconds } = await runHere(process.execPath, args, env);
  return tell(name, code, seconds);
}

/** Prints how a step ended, and hands that back. */
export function tell(name, code, seconds) {
  console.log(`── ${name}: ${code === 0 ? 'ok' : 'FAILED'}, ${seconds.toFixed(1)} s`);
  return { name, code };
}

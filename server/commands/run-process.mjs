import { spawn } from 'node:child_process';
import { constants } from 'node:os';

/** @typedef {{ code: number, output: string, seconds: number }} Ended */

const running = new Set();

/**
 * Runs a program to its end with this one's input and output.
 * @returns {Promise<Ended>} a signal counts as exit code 128 + its number, as shells have it
 */
export function runHere(program, args, env = {}) {
  return run(program, args, env, 'inherit');
}

/** Runs a program to its end and keeps what it writes, so that several can run side by side. */
export function runAside(program, args, env = {}) {
  return run(program, args, env, ['ignore', 'pipe', 'pipe']);
}

/** Tells in one sentence why nothing more can be done, and ends with code 1. */
export function refuse(sentence) {
  console.error(sentence);
  process.exit(1);
}

function run(program, args, env, stdio) {
  const begun = Date.now();
  return new Promise((resolve) => {
    const child = spawn(program, args, { stdio, env: { ...process.env, ...env } });
    const written = [];
    child.stdout?.on('data', (chunk) => written.push(chunk));
    child.stderr?.on('data', (chunk) => written.push(chunk));
    running.add(child);
    const end = (code) => {
      running.delete(child);
      resolve({
        code,
        output: Buffer.concat(written).toString('utf8'),
        seconds: (Date.now() - begun) / 1000,
      });
    };
    child.on('error', (error) => {
      written.push(Buffer.from(`${error.message}\n`));
      if (stdio === 'inherit') console.error(error.message);
      end(127);
    });
    child.on('close', (code, signal) => end(code ?? 128 + (constants.signals[signal] ?? 0)));
  });
}

function handOn(signal) {
  if (running.size === 0) process.exit(128 + constants.signals[signal]);
  // A terminal has sent Ctrl-C to the children already; a second one would tell them to stop at once.
  if (signal === 'SIGINT' && process.stdin.isTTY) return;
  for (const child of running) child.kill(signal);
}

for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => handOn(signal));

// npm hands a signal only to the shell between it and this process; that the shell has gone is all that arrives here.
if (process.env.npm_lifecycle_event) {
  const shell = process.ppid;
  const watch = setInterval(() => {
    if (process.ppid === shell) return;
    clearInterval(watch);
    handOn('SIGTERM');
  }, 200);
  watch.unref();
}

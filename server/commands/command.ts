import { DatabaseRefused } from '#db/database';
import { Refusal } from '#shared/domain/refusal';
import { ConfigRefused } from '../config';

/** Why a command does nothing; its message is one clear sentence. */
export class CommandRefused extends Error {}

/** Runs a command to its end: what it refuses is told in a sentence, and ends with code 1. */
export async function runCommand(work: () => Promise<void> | void): Promise<void> {
  try {
    await work();
  } catch (error) {
    console.error(sentenceOf(error));
    process.exitCode = 1;
  }
}

/** Bytes as a person reads them. */
export function readableSize(bytes: number): string {
  if (bytes < 1_000_000) return `${Math.ceil(bytes / 1000)} kB`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}

function sentenceOf(error: unknown): string {
  if (!(error instanceof Error)) return `This did not work: ${String(error)}.`;
  const known =
    error instanceof CommandRefused ||
    error instanceof ConfigRefused ||
    error instanceof DatabaseRefused;
  if (known) return error.message;
  if (error instanceof Refusal) {
    const problems = error.problems.map(({ path, message }) => `${optionOf(path)}: ${message}`);
    return [error.detail, ...problems].join('\n  ');
  }
  const code = 'code' in error ? String(error.code) : '';
  if (code.startsWith('ERR_PARSE_ARGS')) return `${error.message.split('. ')[0]}.`;
  return `This did not work: ${error.message}.`;
}

/** The option, or variable, that a field of the API is given by on the command line. */
function optionOf(path: string): string {
  const [, field = ''] = path.split('/');
  const named: Readonly<Record<string, string>> = {
    branches: '--branch',
    regions: '--region',
    password: 'UNDERSEAM_PASSWORD',
  };
  return named[field] ?? `--${field}`;
}

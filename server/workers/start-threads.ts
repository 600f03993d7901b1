import { extname, join } from 'node:path';
import { Piscina } from 'piscina';

/** What threads are started for, and how many of them at most. */
export interface Threads {
  /** The program beside this file, without its ending. */
  program: string;
  atMost: number;
  /** Told to each thread when it starts. */
  data?: unknown;
  /** Tasks that may wait. */
  queue?: number;
}

/**
 * Starts threads of one program; the first at once, more when there is work for them. From source a thread reads TypeScript
 * itself, which takes it a second; where the sources have just been built (`UNDERSEAM_BUILT=on`, as in `npm test`) it runs what
 * was built of them.
 */
export function startThreads<Task, Out>({
  program,
  atMost,
  data,
  queue,
}: Threads): Piscina<Task, Out> {
  const pool = new Piscina<Task, Out>({
    ...threadProgram(program),
    workerData: data,
    minThreads: 1,
    maxThreads: atMost,
    idleTimeout: 60_000,
    ...(queue !== undefined && { maxQueue: queue }),
  });
  // A thread that dies at work fails its task, and the next task gets a new one; one that dies idle fails nobody.
  return pool.on('error', () => undefined);
}

function threadProgram(program: string): { filename: string; execArgv: string[] } {
  const file = `${program}${extname(__filename)}`;
  if (!__filename.endsWith('.ts')) return { filename: join(__dirname, file), execArgv: [] };
  if (process.env['UNDERSEAM_BUILT'] === 'on') {
    const built = join(__dirname, '..', '..', 'dist', 'server', 'workers', `${program}.js`);
    return { filename: built, execArgv: [] };
  }
  return {
    filename: join(__dirname, file),
    execArgv: ['--import', 'tsx', '--conditions=underseam-source'],
  };
}

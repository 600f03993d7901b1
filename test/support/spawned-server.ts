import { spawn, type ChildProcess } from 'node:child_process';
import { programArgs } from './program';
import { root } from './project-files';

/** How a process of the server ended. */
export interface Ended {
  code: number | null;
  stdout: string;
  stderr: string;
}

/** The real server in a process of its own. */
export class SpawnedServer {
  private stdout = '';
  private stderr = '';
  readonly ended: Promise<Ended>;

  private static readonly running = new Set<SpawnedServer>();

  /** Ends whatever a test has left running. */
  static async killAll(): Promise<void> {
    await Promise.all([...SpawnedServer.running].map((server) => server.kill()));
  }

  private constructor(private readonly child: ChildProcess) {
    SpawnedServer.running.add(this);
    child.stdout?.on('data', (chunk: Buffer) => (this.stdout += chunk.toString()));
    child.stderr?.on('data', (chunk: Buffer) => (this.stderr += chunk.toString()));
    this.ended = new Promise((resolve) => {
      child.once('close', (code) => resolve({ code, stdout: this.stdout, stderr: this.stderr }));
    });
  }

  /** Starts one with nothing in its environment but these settings; what it says is kept. */
  static start(settings: Record<string, string>): SpawnedServer {
    const child = spawn(process.execPath, programArgs('server/main'), {
      cwd: root,
      env: { PATH: process.env['PATH'], UNDERSEAM_DEMO: 'off', ...settings },
    });
    return new SpawnedServer(child);
  }

  /** The address it serves, once it says so; throws when it ends before. */
  async address(): Promise<string> {
    const gone = this.ended.then(({ stderr }) => {
      throw new Error(`the server ended: ${stderr}`);
    });
    const told = (async () => {
      for (;;) {
        const [, port] = /serves http:\/\/localhost:(\d+)/.exec(this.stdout) ?? [];
        if (port !== undefined) return `http://127.0.0.1:${port}`;
        await new Promise((resolve) => setTimeout(resolve, 20));
      }
    })();
    return Promise.race([told, gone]);
  }

  /** What it has said so far. */
  get said(): string {
    return this.stdout + this.stderr;
  }

  /** Ends it at once, as a power cut would. */
  kill(): Promise<Ended> {
    this.child.kill('SIGKILL');
    return this.ended;
  }

  /** Asks it to end. */
  stop(): Promise<Ended> {
    this.child.kill('SIGTERM');
    return this.ended;
  }
}

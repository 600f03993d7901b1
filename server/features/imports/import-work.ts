import type { LiveProgress } from './tell-import';

/** A piece of work on a file, on its way or waiting for its turn. */
export interface ImportWork {
  live: LiveProgress;
  /** Why it is to end before its end: somebody cancelled it, or the server goes down. */
  stop: 'cancel' | 'close' | undefined;
  /** Lets go of what it reads from, so that it ends soon. */
  release: () => void;
  /** Begins it unless it has begun; settles when it has ended. */
  run: () => Promise<void>;
  ended: Promise<void>;
}

/** The work that is under way, by file; of each sort one after another. */
export class ImportWorks {
  private readonly works = new Map<string, ImportWork>();
  private readonly lanes = { check: Promise.resolve(), write: Promise.resolve() };

  of(id: string): ImportWork | undefined {
    return this.works.get(id);
  }

  /** Begins a work when those before it in its lane have ended. `run` never rejects. */
  begin(
    lane: 'check' | 'write',
    id: string,
    live: LiveProgress,
    run: (work: ImportWork) => Promise<void>,
  ): void {
    let running: Promise<void> | undefined;
    const work: ImportWork = {
      live,
      stop: undefined,
      release: () => undefined,
      run: () =>
        (running ??= run(work).then(() => {
          if (this.works.get(id) === work) this.works.delete(id);
        })),
      ended: Promise.resolve(),
    };
    this.works.set(id, work);
    work.ended = this.lanes[lane].then(() => work.run());
    this.lanes[lane] = work.ended;
  }

  /** Ends the work on a file and settles when it has ended. */
  async stop(id: string, why: 'cancel' | 'close'): Promise<void> {
    const work = this.works.get(id);
    if (!work) return;
    work.stop ??= why;
    work.release();
    // One that still waits for its turn ends at once.
    await work.run();
  }

  async stopAll(): Promise<void> {
    await Promise.all([...this.works.keys()].map((id) => this.stop(id, 'close')));
  }
}

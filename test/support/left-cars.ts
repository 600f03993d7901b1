import type { Answer, TestApp } from './app';
import { validJob, type SmallNetwork } from './small-network';

/** The reference that a finding of `leftAt` gets. */
export const FLOOR = 'floor/left/1';

/** A structural finding left on the floor, on the left; override what a test is about. */
export const leftAt = (over: object = {}): object => ({
  zone: 'floor',
  side: 'left',
  seenAs: 'bubbling',
  structural: true,
  action: 'deferred',
  ...over,
});

/** The same place mended. */
export const mendedAt = (over: object = {}): object =>
  leftAt({ workedAs: 'bubbling', action: 'treated', ...over });

/** The car of the valid job under another key. */
export const carOf = (key: string | undefined): object => ({
  ...(validJob()['vehicle'] as object),
  key,
});

/** Where a finding left on a car is read and marked. */
export const leftPath = (job: string, ref = FLOOR, branch = 'AAA'): string =>
  `/api/branches/${branch}/come-back/${encodeURIComponent(job)}/${encodeURIComponent(ref)}`;

/** Cars of a small network on which something was left, and what is said of them. */
export class LeftCars {
  private last = 0;

  constructor(
    private readonly app: TestApp,
    private readonly network: SmallNetwork,
  ) {}

  /** Sends a job, or a correction of one; gives its reference. */
  async put(
    over: Record<string, unknown>,
    { branch = 'AAA', ref = `cb-${(this.last += 1)}` } = {},
  ): Promise<string> {
    const path = `/api/branches/${branch}/jobs/${encodeURIComponent(ref)}`;
    const body = validJob(over);
    const answer = await this.app.call('put', path, { token: this.network.office, body });
    if (answer.status > 201) throw new Error(answer.text);
    return ref;
  }

  /** Sends a job of a car never seen before, with one structural finding left on it. */
  leave(
    over: Record<string, unknown> = {},
    where: { ref?: string; branch?: string } = {},
  ): Promise<string> {
    const key = `C-${this.last + 1}`;
    return this.put({ vehicle: carOf(key), findings: [leftAt()], ...over }, where);
  }

  void(ref: string): Promise<Answer> {
    return this.app.call('delete', `/api/branches/AAA/jobs/${ref}`, {
      token: this.network.manager,
    });
  }

  get(job: string, ref?: string, token = this.network.manager): Promise<Answer> {
    return this.app.call('get', leftPath(job, ref), { token });
  }

  mark(job: string, body: object, token = this.network.manager, ref?: string): Promise<Answer> {
    return this.app.call('put', leftPath(job, ref), { token, body });
  }
}

import { compareSync, hashSync } from 'bcryptjs';

/** One piece of work for the password thread; passwords arrive ready to be hashed. */
export type PasswordWork =
  | { kind: 'hash'; password: string; cost: number }
  | { kind: 'compare'; password: string; hash: string };

/** Runs in the thread, where blocking for a quarter of a second holds nobody up. */
export default function work(task: PasswordWork): string | boolean {
  return task.kind === 'hash'
    ? hashSync(task.password, task.cost)
    : compareSync(task.password, task.hash);
}

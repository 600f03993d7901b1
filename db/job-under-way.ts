import type { Moneyed } from '#shared/domain/keep-stored-money';
import type { Connection } from './database';

/** What has been written down of a job that is under way, or `undefined`. */
export function contentUnderWay(
  connection: Connection,
  branchId: number,
  jobRef: string,
): Moneyed | undefined {
  const row = connection
    .prepare('select content from jobs_under_way where branch_id = ? and job_ref = ?')
    .get(branchId, jobRef) as { content: string } | undefined;
  return row && (JSON.parse(row.content) as Moneyed);
}

/** Accepted, whichever way it came, a job is no longer under way. Inside a write. */
export function endUnderWay(connection: Connection, branchId: number, jobRef: string): void {
  connection
    .prepare('delete from jobs_under_way where branch_id = ? and job_ref = ?')
    .run(branchId, jobRef);
}

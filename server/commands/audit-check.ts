import path from 'node:path';
import { parseArgs } from 'node:util';
import { inspectAudit } from '#db/copy-database';
import { readConfig } from '../config';
import { runCommand } from './command';

/**
 * `npm run audit:check -- [--data FOLDER]`: recomputes the chain of the whole audit trail, also while the server runs. Ends
 * with code 1 and names the first event that does not follow from the one before it.
 */
function auditCheck(): void {
  const { values } = parseArgs({ options: { data: { type: 'string' } }, strict: true });
  const folder = values.data ?? readConfig(process.env).data;
  const { events, since, lastHash } = inspectAudit(path.join(folder, 'underseam.sqlite'));
  if (since === null) {
    console.log('The audit trail holds: nothing is in it yet.');
    return;
  }
  console.log(
    `The audit trail holds: ${events} events since ${since.slice(0, 10)}; the last hash is ${lastHash}.`,
  );
}

void runCommand(auditCheck);

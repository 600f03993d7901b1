import path from 'node:path';
import { parseArgs } from 'node:util';
import { readConfig } from '../config';
import { CommandRefused, readableSize, runCommand } from './command';
import { restoreBackup } from './restore-backup';

/** `npm run restore -- --from FILE [--data FOLDER] [--move-aside]`: a checked backup back into a data folder; the server must be stopped. */
async function restore(): Promise<void> {
  const { values } = parseArgs({
    options: {
      from: { type: 'string' },
      data: { type: 'string' },
      'move-aside': { type: 'boolean', default: false },
    },
    strict: true,
  });
  if (values.from === undefined) throw new CommandRefused('Name the backup with --from FILE.');
  const folder = values.data ?? readConfig(process.env).data;
  const { bytes, jobs, auditEvents, keptIn } = await restoreBackup(
    values.from,
    path.join(folder, 'underseam.sqlite'),
    values['move-aside'] ? 'move-aside' : 'refuse',
    new Date(),
  );
  console.log(
    `Restored ${values.from} into ${folder}: ${readableSize(bytes)}, ${jobs} jobs, ${auditEvents} audit events; checked whole.`,
  );
  if (keptIn) console.log(`The former database is kept in ${keptIn}.`);
}

void runCommand(restore);

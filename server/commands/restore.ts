import path from 'node:path';
import { parseArgs } from 'node:util';
import { readConfig } from '../config';
import { CommandRefused, readableSize, runCommand } from './command';
import { restoreBackup } from './restore-backup';

/** `npm run restore -- FILE [--data FOLDER] [--move-aside]`: a checked backup back into a data folder; the server must be stopped. */
async function restore(): Promise<void> {
  const { values, positionals } = parseArgs({
    options: {
      data: { type: 'string' },
      'move-aside': { type: 'boolean', default: false },
    },
    allowPositionals: true,
    strict: true,
  });
  const [file, ...more] = positionals;
  if (file === undefined || more.length > 0) {
    throw new CommandRefused('Name the one backup to restore: npm run restore -- FILE.');
  }
  const { data, bucket } = readConfig(process.env);
  const folder = values.data ?? data;
  const { bytes, jobs, auditEvents, photoKeys, missing, keptIn } = await restoreBackup(
    file,
    path.join(folder, 'underseam.sqlite'),
    values['move-aside'] ? 'move-aside' : 'refuse',
    new Date(),
  );
  console.log(
    `Restored ${file} into ${folder}: ${readableSize(bytes)}, ${jobs} jobs, ${auditEvents} audit events; checked whole.`,
  );
  if (missing > 0 && !bucket) {
    console.log(`Of ${photoKeys.length} photos, ${missing} were not beside the backup.`);
  }
  if (keptIn) console.log(`The former database is kept in ${keptIn}.`);
}

void runCommand(restore);

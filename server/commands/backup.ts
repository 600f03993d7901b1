import path from 'node:path';
import { parseArgs } from 'node:util';
import { readConfig } from '../config';
import { CommandRefused, readableSize, runCommand } from './command';
import { takeBackup } from './take-backup';

/** `npm run backup -- [FILE] [--data FOLDER]`: a checked copy of the database, taken while the server runs. */
async function backup(): Promise<void> {
  const { values, positionals } = parseArgs({
    options: { data: { type: 'string' } },
    allowPositionals: true,
    strict: true,
  });
  const begun = Date.now();
  const folder = values.data ?? readConfig(process.env).data;
  const stamp = new Date(begun).toISOString().replace(/[-:]|\.\d+/g, '');
  const [file, ...more] = positionals;
  if (more.length > 0) throw new CommandRefused('Name one file to back up to.');
  const target = file ?? path.join(folder, 'backups', `underseam-${stamp}.sqlite`);
  const { bytes, jobs, auditEvents } = await takeBackup(
    path.join(folder, 'underseam.sqlite'),
    target,
  );
  const seconds = ((Date.now() - begun) / 1000).toFixed(1);
  console.log(
    `Backed up to ${target} in ${seconds} s: ${readableSize(bytes)}, ${jobs} jobs, ${auditEvents} audit events; the copy was checked whole.`,
  );
}

void runCommand(backup);

import path from 'node:path';
import { parseArgs } from 'node:util';
import { readConfig } from '../config';
import { CommandRefused, readableSize, runCommand } from './command';
import { takeBackup } from './take-backup';

/** `npm run backup -- [FILE] [--data FOLDER]`: a checked copy of the database and the photos of a data folder, taken while the server runs. */
async function backup(): Promise<void> {
  const { values, positionals } = parseArgs({
    options: { data: { type: 'string' } },
    allowPositionals: true,
    strict: true,
  });
  const begun = Date.now();
  const { data, bucket } = readConfig(process.env);
  const folder = values.data ?? data;
  const stamp = new Date(begun).toISOString().replace(/[-:]|\.\d+/g, '');
  const [file, ...more] = positionals;
  if (more.length > 0) throw new CommandRefused('Name one file to back up to.');
  const target = file ?? path.join(folder, 'backups', `underseam-${stamp}.sqlite`);
  const taken = await takeBackup(path.join(folder, 'underseam.sqlite'), target);
  const { bytes, jobs, auditEvents, photoKeys, photosIn, missing } = taken;
  const seconds = ((Date.now() - begun) / 1000).toFixed(1);
  console.log(
    `Backed up to ${target} in ${seconds} s: ${readableSize(bytes)}, ${jobs} jobs, ${auditEvents} audit events; the copy was checked whole.`,
  );
  if (photosIn !== undefined) {
    console.log(
      `The photos of the data folder are beside it, in ${photosIn}; the two belong together.`,
    );
  }
  if (bucket && photoKeys.length > 0) {
    console.log(
      `Photos lie in the bucket ${bucket.bucket}, which this does not copy: whoever runs that store backs it up.`,
    );
  } else if (missing > 0) {
    console.log(`Of ${photoKeys.length} photos, ${missing} have no bytes in the data folder.`);
  }
}

void runCommand(backup);

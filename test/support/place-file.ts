import { renameSync } from 'node:fs';
import { sql } from '#db/database';
import type { TestApp } from './app';
import { sendFile } from './send-file';

/** A file of one good row and one refused, checked and not confirmed. */
const CONTENT =
  'job,make,model,body,registered,package,completed,strip\nin-a-file,A,B,van,2010-01,full,2026-01-28,10\nno-car,,,,,,,\n';

/** Sends a file of a branch and gives it an id that is known beforehand. */
export async function placeFile(
  app: TestApp,
  token: string,
  id: string,
  branch = 'AAA',
): Promise<void> {
  const sent = await sendFile(app, token, { branch, content: CONTENT });
  const given = (sent.body as { id?: string }).id;
  if (sent.status !== 201 || given === undefined) throw new Error(`a file: ${sent.text}`);
  const { store, imports } = app.kit;
  await imports.settled(given, 10_000);
  await store.queue.write(() =>
    store.unscoped.run(sql('imports').where({ id: given }).update({ id })),
  );
  renameSync(imports.folder.fileOf(given), imports.folder.fileOf(id));
  renameSync(imports.folder.refusedOf(given), imports.folder.refusedOf(id));
}

import { readNetwork } from '#db/queries/network';
import { findImport, listImports, readImportCatalogue } from '#db/queries/imports';
import type { FieldProblem } from '#shared/contracts/fields';
import {
  cancelImport,
  changeImport,
  confirmImport,
  getImport,
  getRefusedRows,
  listImports as listImportsCall,
  putClaimFile,
  putJobFile,
  type ImportedFile,
  type ImportKind,
} from '#shared/contracts/imports';
import { notFound } from '#shared/domain/refusal';
import { actorOf } from '../../auth/caller';
import { realClock } from '../../clock';
import { streamCsv } from '../../http/csv-stream';
import { mount, namedBranch, type Call, type Mounting, type Reply } from '../../http/mount';
import { dropReceived, type ReceivedFile } from '../../http/read-upload';
import type { Kit } from '../../kit';
import { breaksOfColumns } from './breaks-of-columns';
import type { ImportSender } from './import-sender';
import { refusedCsv } from './refused-rows';
import { tellImport, tellListed } from './tell-import';

/** How long a call waits for a check to end before it answers how far it is. */
const PATIENCE_MS = 8000;
const LISTED = 100;

/** Files of jobs and claims: sent, read another way, confirmed, cancelled. */
export function mountImports(mounting: Mounting, kit: Kit): void {
  const told = (call: Call, id: string): ImportedFile => {
    const db = kit.store.scoped(call.scope);
    const found = findImport(db, namedBranch(call).code, id);
    if (!found) throw notFound();
    return tellImport(found, readImportCatalogue(db), kit.imports.liveOf(id));
  };
  const exists = ({
    scope,
    branch,
    params,
  }: Pick<Call, 'scope' | 'branch'> & { params: { id: string } }): boolean =>
    branch !== undefined &&
    findImport(kit.store.scoped(scope), branch.code, params.id) !== undefined;

  for (const [contract, kind] of [
    [putJobFile, 'jobs'],
    [putClaimFile, 'claims'],
  ] as const) {
    mount(mounting, contract, async (call) => {
      const id = await receive(kit, call, kind);
      await kit.imports.settled(id, PATIENCE_MS);
      return { body: told(call, id) };
    });
  }

  mount(mounting, listImportsCall, (call) => {
    const rows = listImports(kit.store.scoped(call.scope), namedBranch(call).code, LISTED);
    return { body: { items: rows.map((row) => tellListed(row, kit.imports.liveOf(row.id))) } };
  });

  mount(mounting, getImport, (call) => ({ body: told(call, call.params.id) }), { exists });

  mount(
    mounting,
    changeImport,
    async (call) => {
      const { id } = call.params;
      const { options, columns } = call.body;
      const said = new Map(columns.map(({ index, field }) => [index, field]));
      const correction = { options, columns: said };
      await kit.imports.correct(namedBranch(call), id, correction, senderOf(kit, call));
      await kit.imports.settled(id, PATIENCE_MS);
      return { body: told(call, id) };
    },
    {
      exists,
      rules: (raw, { scope, branch, params }): FieldProblem[] => {
        const db = kit.store.scoped(scope);
        const found = branch && params && findImport(db, branch.code, params.id);
        return found ? breaksOfColumns(raw, found, readImportCatalogue(db)) : [];
      },
    },
  );

  mount(
    mounting,
    confirmImport,
    async (call) => {
      await kit.imports.confirm(namedBranch(call), call.params.id, senderOf(kit, call));
      return { body: told(call, call.params.id) };
    },
    { exists },
  );

  mount(
    mounting,
    cancelImport,
    async (call) => {
      await kit.imports.cancel(namedBranch(call), call.params.id, senderOf(kit, call));
      return { body: told(call, call.params.id) };
    },
    { exists },
  );

  mount(mounting, getRefusedRows, (call) => refusedRows(kit, call), { exists });
}

/** Takes a received file in, or lets go of it when it is refused. */
async function receive(
  kit: Kit,
  call: Call<unknown, unknown, ReceivedFile>,
  kind: ImportKind,
): Promise<string> {
  try {
    return await kit.imports.receive(namedBranch(call), kind, call.body, senderOf(kit, call));
  } catch (error) {
    await dropReceived(call.body);
    throw error;
  }
}

function refusedRows(kit: Kit, call: Call<{ id: string }>): Reply<string> {
  const { id } = call.params;
  const found = findImport(kit.store.scoped(call.scope), namedBranch(call).code, id);
  if (!found) throw notFound();
  const headings = found.columns.map(({ heading }) => heading);
  const rows = refusedCsv(kit.imports.folder.refusedOf(id), headings, found.options.delimiter);
  const chunks = {
    [Symbol.asyncIterator]: () => rows,
    cancel: () => void rows.return(undefined),
  };
  return { stream: (response) => streamCsv(response, `refused-${found.kind}.csv`, chunks) };
}

function senderOf(kit: Kit, call: Call): ImportSender {
  const { caller } = call;
  if (caller?.kind !== 'person') throw new Error('only people send files');
  const actor = actorOf(caller, call.address);
  if (actor.personId === null) throw new Error('a person without an id');
  return {
    actor: { ...actor, personId: actor.personId },
    at: realClock.now().toISOString(),
    claims: { role: caller.role, limitCents: readNetwork(kit.store.unscoped).claimLimitCents },
  };
}

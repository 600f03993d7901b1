import { recordAudit } from '#db/queries/audit';
import type { Store } from '#db/store';
import { worldOf } from '#shared/contracts/check-job';
import type { DemoNetwork } from './demo-network';
import { costsKnownFrom } from './dated-costs';
import { DEMO_SEED, generateNetwork } from './generate-network';
import { actionEvents } from './load-actions';
import { loadHistory, type LaterEvent } from './load-history';
import {
  hashPasswords,
  loadPeople,
  loadSenders,
  type HashedPerson,
  type PasswordHasher,
} from './load-people';
import { loadSetUp } from './load-set-up';

/**
 * Fills an empty data folder with the demo network as seen from a day and gives the number of jobs. One commit: after an
 * interruption the folder is as empty as before, and the next start makes the demo anew.
 */
export async function loadNetwork(
  store: Store,
  passwords: PasswordHasher,
  today: string,
  network: DemoNetwork = generateNetwork({ seed: DEMO_SEED, today }),
): Promise<number> {
  const people = await hashPasswords(passwords);
  try {
    return await store.queue.write(() => load(store, people, today, network));
  } catch (error) {
    // What is kept in memory was read from rows that are gone again.
    store.state.reload();
    throw error;
  }
}

function load(
  store: Store,
  people: readonly HashedPerson[],
  today: string,
  network: DemoNetwork,
): number {
  const db = store.unscoped;
  const createdAt = `${costsKnownFrom(today)}T08:00:00.000Z`;
  loadSetUp(db, network.setUp);
  const ids = loadPeople(db, people, createdAt);
  store.state.reload();
  const senders = loadSenders(db, store.state.branches, ids, createdAt);
  const world = worldOf(store.state, today);
  recordAudit(db, {
    at: createdAt,
    actor: { label: 'system', personId: null, pushKeyId: null, address: 'local' },
    action: 'demo.make',
    subject: '/network',
    branchId: null,
    detail: { seed: DEMO_SEED, today, branches: store.state.branches.length },
  });
  let jobs = 0;
  const later: LaterEvent[] = [];
  for (const history of network.histories()) {
    const branch = store.state.branches.find(({ code }) => code === history.branchCode);
    const own = senders.get(history.branchCode);
    if (!branch || !own) throw new Error(`the demo has no branch ${history.branchCode}`);
    const { claimLimitCents } = network.setUp.network;
    const loading = { store, branch, senders: own, world, claimLimitCents };
    later.push(...loadHistory(loading, history));
    jobs += history.jobs.length;
  }
  later.push(...actionEvents(store, ids, today));
  later.sort((a, b) => (a.at < b.at ? -1 : a.at > b.at ? 1 : 0));
  for (const { happen } of later) happen();
  return jobs;
}

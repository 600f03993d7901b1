import { LookWriter, type SignalToKeep } from '#db/signal-writer';
import { addDays } from '#shared/domain/calendar';
import type { TestApp } from './app';
import { sendFile } from './send-file';
import { validJob, type SmallNetwork } from './small-network';
import { jpegOf, sendPhoto } from './send-photo';
import { ACTION, findingsWithOneLeft, GOING } from './walk-contracts';

/** What is to be changed, and how. */
export interface Disturbance {
  /** Branches outside; one more is added each round. */
  outside: readonly { branch: string; region: string }[];
  /** Regions that lie outside as a whole. */
  regions: readonly string[];
  /** Which branches get cars: all, or only some so that too few stand behind a network figure. */
  busy: 'all' | readonly string[];
  /** Counts up from 1 to at most 24, so that every time is another. */
  round: number;
}

/**
 * Changes everything that lies outside some branches, each time in another way: jobs sent, corrected and voided, claims,
 * findings left and what is marked on them, photos, jobs under way, rates, notes, bookings, actions, targets, the names of branches and of
 * regions, signals, a branch and a region more.
 */
export async function disturbOutside(
  app: TestApp,
  { office: token }: SmallNetwork,
  { outside, regions, busy, round }: Disturbance,
): Promise<void> {
  const send = async (method: string, path: string, body?: unknown): Promise<void> => {
    const answer = await app.call(method, path, { token, ...(body !== undefined && { body }) });
    const rejected = (answer.body as { counts?: { rejected: number } } | undefined)?.counts
      ?.rejected;
    if (answer.status >= 300 || rejected)
      throw new Error(`${method} ${path}: ${answer.status} ${answer.text}`);
  };
  const added = { branch: `NEW${round}`, region: `REG${round}` };
  await send('put', `/api/regions/${added.region}`, { name: 'Added' });
  for (const region of regions) {
    const climate = { ...CLIMATE, temperatureC: round };
    await send('put', `/api/regions/${region}`, { name: `Region ${round}`, climate });
  }
  for (const { branch, region } of [...outside, added]) {
    const at = `/api/branches/${branch}`;
    await send('put', at, {
      name: `Renamed ${round}`,
      region,
      timeZone: round % 2 === 0 ? 'Pacific/Kiritimati' : 'Pacific/Pago_Pago',
      openedOn: '2010-01-01',
      targetMarginShare: round / 100,
    });
    await send('put', `${at}/rates/2026-01-${String(round).padStart(2, '0')}`, {
      hourlyCostCents: 5000 + round,
    });
    for (const bodyType of ['suv', 'hatchback']) {
      await send('put', `${at}/bookings/${bodyType}-${round}`, {
        expectedOn: '2026-02-10',
        package: 'full',
        bodyType,
      });
    }
    await send('put', `${at}/weeks/2026-W05/note`, { text: `round ${round}` });
    await send('post', `${at}/actions`, { ...ACTION, what: `round ${round}` });
    await send('put', `${at}/targets/overrun`, { value: 1 + round / 100 });
    const file = await sendFile(app, token, { branch, content: `job,odd ${round}\nj,1\n` });
    if (file.status >= 300) throw new Error(`file at ${branch}: ${file.text}`);
    await placeSignalOutside(app, branch, round);
    await send('put', `${at}/under-way/${GOING}`, { notes: `round ${round}` });
    if (busy !== 'all' && !busy.includes(branch)) continue;
    await disturbCars(send, at, round);
    const photo = await jpegOf(10 + round, 10);
    for (const shown of ['jobs', 'claims']) {
      const sent = await sendPhoto(app, `${at}/${shown}/walked/photos/walked`, photo, { token });
      if (sent.status >= 300) throw new Error(`photo at ${branch}: ${sent.text}`);
    }
  }
}

/** One signal more of that branch, found by a look before the one of the walks: of the newest look everybody is told the day. */
function placeSignalOutside(app: TestApp, code: string, round: number): Promise<void> {
  const { store } = app.kit;
  const branchId = store.state.branches.find((branch) => branch.code === code)?.id ?? 0;
  const found: SignalToKeep = {
    ...{ branchId, measure: null, since: '2026-01-10', cars: round, behind: null },
    ...{ kind: 'silence', key: `round ${round}`, strength: round, facts: {}, listed: [] },
  };
  const day = addDays('1990-01-01', 100 * branchId + round);
  const changes = { opened: [found], kept: [], ended: [] };
  return store.queue.write(() => new LookWriter(store).keep(day, `${day}T01:00:00.000Z`, changes));
}

const CLIMATE = { temperatureC: 9, humidityPct: 78, so2Deposition: 4, chlorideDeposition: 30 };

async function disturbCars(
  send: (method: string, path: string, body?: unknown) => Promise<void>,
  at: string,
  round: number,
): Promise<void> {
  await send('post', `${at}/jobs/batch`, { jobs: carsOf(round) });
  await send(
    'put',
    `${at}/jobs/walked`,
    validJob({ notes: `round ${round}`, findings: findingsWithOneLeft() }),
  );
  await send('delete', `${at}/jobs/walked-${round}-3`);
  await send('put', `${at}/come-back/walked/walked`, {
    status: round % 2 === 0 ? 'contacted' : 'booked',
    note: `round ${round}`,
  });
  await send('put', `${at}/claims/walked`, {
    jobRef: 'walked',
    madeOn: '2026-01-30',
    zone: 'floor',
    cause: 'damage',
    decision: 'open',
    costCents: round,
  });
  await send('post', `${at}/jobs/batch`, { jobs: oldCarsOf(round) });
  await send('put', `${at}/claims/old-${round}`, oldClaim(`old-${round}-1`, 1000 * round));
}

/** Cars whose warranty has run out, worked in every way, and too old to be quoted from: each round has others. */
export function oldCarsOf(round: number): object[] {
  return [1, 2, 3, 4, 5, 6].map((n) => ({
    jobRef: `old-${round}-${n}`,
    ...validJob({
      ...{ bookedOn: undefined, startedOn: undefined, completedOn: '2022-06-15', invoice: null },
      vehicle: { ...(validJob()['vehicle'] as object), firstRegistered: '2015-03' },
      checks: { linersOff: n % 3 === 0 ? 'yes' : 'no', driedOut: n === round % 6 ? 'no' : 'yes' },
      products: [{ product: 'CW1', ml: n % 2 === round % 2 ? 2000 : 4000 }],
    }),
  }));
}

/** A claim within such a warranty, paid long ago. */
export function oldClaim(jobRef: string, costCents: number): object {
  return {
    ...{ jobRef, madeOn: '2023-02-01', zone: 'floor', cause: 'damage', decision: 'accepted' },
    ...{ decidedOn: '2023-02-10', paidOn: '2023-02-20', costCents },
  };
}

/** Half of the cars of one age, so that a quote finds enough of them, the others of every age: each round has another mix of ages, other rot and other minutes. */
function carsOf(round: number): object[] {
  const vehicle = validJob()['vehicle'] as object;
  return [1, 2, 3, 4, 5, 6].map((n) => ({
    jobRef: `walked-${round}-${n}`,
    ...validJob({
      vehicle: {
        ...vehicle,
        firstRegistered: n > 3 ? '2019-03' : `${2026 - ((n * round * 4) % 24)}-01`,
      },
      completedOn: `2026-01-2${(n % 3) + 5}`,
      startedOn: '2026-01-20',
      invoice: n === 1 ? null : { totalCents: 10_000 * round + n },
      products: [{ product: 'CW1', ml: 3000 + 100 * round + n }],
      actual: { stages: { strip: 100 * round + n, repair: 185 } },
      ...(n === 2 && { estimate: undefined }),
      findings: n % 2 === round % 2 ? [] : findingsWithOneLeft(),
    }),
  }));
}

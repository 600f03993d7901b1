import type { TestApp } from './app';
import { validJob, type SmallNetwork } from './small-network';

/**
 * Changes everything that lies outside some branches, each time in another way: jobs sent, corrected and voided, claims,
 * rates, notes, bookings, the names of branches and of regions, a branch and a region more.
 */
export async function disturbOutside(
  app: TestApp,
  { office: token }: SmallNetwork,
  outside: readonly { branch: string; region: string }[],
  regions: readonly string[],
  round: number,
): Promise<void> {
  const send = async (method: string, path: string, body?: unknown): Promise<void> => {
    const answer = await app.call(method, path, { token, ...(body !== undefined && { body }) });
    if (answer.status >= 300) throw new Error(`${method} ${path}: ${answer.status} ${answer.text}`);
  };
  const added = { branch: `NEW${round}`, region: `REG${round}` };
  await send('put', `/api/regions/${added.region}`, { name: 'Added' });
  for (const region of regions)
    await send('put', `/api/regions/${region}`, { name: `Region ${round}` });
  for (const { branch, region } of [...outside, added]) {
    const at = `/api/branches/${branch}`;
    await send('put', at, {
      name: `Renamed ${round}`,
      region,
      timeZone: round % 2 === 0 ? 'Pacific/Kiritimati' : 'Pacific/Pago_Pago',
      openedOn: '2010-01-01',
      targetMarginShare: round / 100,
    });
    await send('put', `${at}/rates/2026-01-0${round}`, { hourlyCostCents: 5000 + round });
    const jobs = [1, 2, 3].map((n) => ({
      jobRef: `walked-${round}-${n}`,
      ...validJob({
        completedOn: `2026-01-2${n + 4}`,
        startedOn: '2026-01-20',
        invoice: n === 1 ? null : { totalCents: 10_000 * round + n },
        ...(n === 2 && { estimate: undefined }),
      }),
    }));
    await send('post', `${at}/jobs/batch`, { jobs });
    await send('put', `${at}/jobs/walked`, validJob({ notes: `round ${round}` }));
    await send('delete', `${at}/jobs/walked-${round}-3`);
    await send('put', `${at}/claims/walked`, {
      jobRef: 'walked',
      madeOn: '2026-01-30',
      zone: 'floor',
      cause: 'damage',
      decision: 'open',
      costCents: round,
    });
    await send('put', `${at}/bookings/walked-${round}`, {
      expectedOn: '2026-02-10',
      package: 'full',
      bodyType: 'suv',
    });
    await send('put', `${at}/weeks/2026-W05/note`, { text: `round ${round}` });
  }
}

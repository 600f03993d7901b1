import type { TestApp } from './app';

/** Tokens of the people of a small network, and push keys by branch. */
export interface SmallNetwork {
  office: string;
  lead: string;
  manager: string;
  recorder: string;
  keys: Record<string, string>;
}

/** Eight branches in two regions: enough that a network figure has five others behind it, and two leads' worth of scope. */
export const BRANCHES = [
  ['AAA', 'COAST'],
  ['BBB', 'COAST'],
  ['CCC', 'HILLS'],
  ['DDD', 'HILLS'],
  ['EEE', 'HILLS'],
  ['FFF', 'HILLS'],
  ['GGG', 'HILLS'],
  ['HHH', 'HILLS'],
] as const;

/**
 * Sets a network up through the API as head office would: hourly cost 36.00, product CW1 at 12.00 a litre with a norm of 4 l
 * for a full hatchback, fee 5 %. Signs in one person a role: the lead has COAST, manager and recorder have AAA.
 */
export async function makeSmallNetwork(app: TestApp): Promise<SmallNetwork> {
  const office = await app.signIn('office@network.example', 'head_office');
  const put = async (path: string, body: unknown): Promise<void> => {
    const answer = await app.call('put', path, { token: office, body });
    if (answer.status >= 300) throw new Error(`${path}: ${answer.status} ${answer.text}`);
  };
  await put('/api/network', { name: 'Small', currency: 'EUR', feeRate: 0.05 });
  await put('/api/regions/COAST', { name: 'Coast' });
  await put('/api/regions/HILLS', { name: 'Hills' });
  for (const [code, region] of BRANCHES) {
    await put(`/api/branches/${code}`, {
      name: `Branch ${code}`,
      region,
      timeZone: 'Europe/Berlin',
      openedOn: '2015-01-01',
    });
    await put(`/api/branches/${code}/rates/2015-01-01`, { hourlyCostCents: 3600 });
  }
  await put('/api/products/CW1', { name: 'Cavity wax', kind: 'cavity_wax' });
  await put('/api/products/CW1/costs/2015-01-01', { costPerLitreCents: 1200 });
  await put('/api/packages/full', { name: 'Full', warrantyMonths: 36 });
  await put('/api/packages/cavity', { name: 'Cavity', warrantyMonths: 24 });
  await put('/api/packages/full/norms/hatchback', { norms: [{ product: 'CW1', ml: 4000 }] });
  const keys: Record<string, string> = {};
  for (const code of ['AAA', 'BBB']) {
    const made = await app.call('post', `/api/branches/${code}/keys`, {
      token: office,
      body: { label: 'test system' },
    });
    keys[code] = (made.body as { key: string }).key;
  }
  return {
    office,
    lead: await app.signIn('lead@network.example', 'regional_lead', { regions: ['COAST'] }),
    manager: await app.signIn('manager@network.example', 'site_manager', { branches: ['AAA'] }),
    recorder: await app.signIn('recorder@network.example', 'recorder', { branches: ['AAA'] }),
    keys,
  };
}

/** A job that passes every rule; override what a test is about. */
export function validJob(overrides: Record<string, unknown> = {}): Record<string, unknown> {
  return {
    vehicle: {
      key: 'K-20411',
      make: 'Velder',
      model: 'Tessock',
      bodyType: 'hatchback',
      firstRegistered: '2009-05',
      odometerKm: 148200,
    },
    package: 'full',
    bookedOn: '2026-01-12',
    startedOn: '2026-01-26',
    completedOn: '2026-01-28',
    estimate: {
      priceCents: 78000,
      stages: { strip: 90, clean: 75, dry: 20, repair: 0, mask: 40, apply: 120, refit: 60 },
    },
    actual: {
      stages: { strip: 110, clean: 150, dry: 30, repair: 185, mask: 35, apply: 130, refit: 95 },
    },
    products: [{ product: 'CW1', ml: 4200 }],
    consumables: [{ kind: 'trim_clip', quantity: 6, unitCostCents: 45 }],
    boughtInCents: 0,
    findings: [
      {
        zone: 'sill_inner',
        side: 'left',
        seenAs: 'bubbling',
        workedAs: 'holed',
        structural: true,
        action: 'patched',
        repairMinutes: 120,
        chargedCents: 9000,
      },
    ],
    checks: {
      linersOff: 'yes',
      bothDirections: 'yes',
      brakesCovered: 'yes',
      driedOut: 'yes',
      drainsClear: 'na',
      primerCured: 'yes',
    },
    workshop: { temperatureC: 14, humidityPct: 61 },
    invoice: { number: '0417', issuedOn: '2026-01-29', totalCents: 87000 },
    notes: '',
    ...overrides,
  };
}

import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { assertScoped, UnscopedRead } from '#db/assert-scoped';
import { sql, type Query } from '#db/database';
import { Scope } from '#db/scope';
import { ScopedDb } from '#db/scoped-db';
import { HANGING_TABLES, SCOPED_TABLES } from '#db/tables';
import { UnscopedDb } from '#db/unscoped-db';
import { ROLES } from '#shared/domain/vocabulary';
import { TestApp } from '../support/app';
import { root } from '../support/project-files';
import { readOnThisThread } from '../support/read-on-this-thread';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';
import { askedOf, contracts, placeSamples } from '../support/walk-contracts';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  await placeSamples(app, network);
  app.kit.reads = readOnThisThread(app.kit.store) as never;
}, 30_000);
afterAll(async () => {
  app.kit.reads = { close: async () => undefined } as never;
  await app.stop();
});

const textOf = (query: Query | string): string =>
  typeof query === 'string' ? query : query.toSQL().toNative().sql;

describe('The tripwire', () => {
  it('given every read of every role, sees no branch’s rows read past the scope', async () => {
    const texts: string[] = [];
    let scoped = 0;
    const spies = [
      ...(['all', 'first', 'run', 'prepare'] as const).map((name) => {
        const own = UnscopedDb.prototype[name] as (query: never) => never;
        return jest.spyOn(UnscopedDb.prototype, name).mockImplementation(function (
          this: UnscopedDb,
          query: Query | string,
        ) {
          texts.push(textOf(query));
          return own.call(this, query as never);
        } as never);
      }),
      jest.spyOn(ScopedDb.prototype, 'derived').mockImplementation(function (
        this: ScopedDb,
        ...asked
      ) {
        scoped += 1;
        return derived.apply(this, asked);
      }),
    ];
    for (const [, endpoint] of contracts) {
      const { access, method, path } = endpoint;
      if (method !== 'get' || access === 'public') continue;
      for (const role of ROLES.filter((one) => access.roles.includes(one))) {
        const token = {
          recorder: network.recorder,
          site_manager: network.manager,
          regional_lead: network.lead,
          head_office: network.office,
        }[role];
        const answer = await app.call('get', askedOf(endpoint), { token });
        expect([path, role, answer.status]).toEqual([path, role, 200]);
      }
    }
    for (const spy of spies) spy.mockRestore();
    expect(scoped).toBeGreaterThan(30);
    expect(texts.length).toBeGreaterThan(30);
    for (const text of texts) expect(() => assertScoped(text)).not.toThrow();
  });

  it('given a statement past the scope on its way through a request, breaks that request', async () => {
    const table = jest
      .spyOn(ScopedDb.prototype, 'table')
      .mockImplementation((name) => sql.from(`${name} as ${name}`));
    for (const path of ['/api/jobs', '/api/costs', '/api/branches/AAA/jobs/walked']) {
      const answer = await app.call('get', path, { token: network.office });
      expect([path, answer.status]).toEqual([path, 500]);
      // And tells the caller nothing of what it is made of.
      expect(answer.text).not.toMatch(/select|job_facts|scope/i);
    }
    table.mockRestore();
    expect((await app.call('get', '/api/jobs', { token: network.office })).status).toBe(200);
  });

  it('given the reader itself, refuses a table of a branch by its bare name', () => {
    const reader = app.kit.store.scoped(Scope.nothing);
    for (const table of [...SCOPED_TABLES, ...HANGING_TABLES]) {
      expect(() => reader.all(sql(table))).toThrow(UnscopedRead);
    }
  });
});

const derived = ScopedDb.prototype.derived;

/** Where branches' tables are named outside a scope, and why: writes bound to one branch, and what runs before anybody reads. */
const NAMED_BARE: Record<string, string> = {
  'action-writer.ts': 'one branch for life',
  'branch-writer.ts': 'one branch for life',
  'claim-writer.ts': 'one branch for life',
  'come-back-writer.ts': 'one branch for life',
  'copy-database.ts': 'counts the jobs of a backup',
  'derived-rows.ts': 'derived rows of one job',
  'import-writer.ts': 'one branch for life',
  'job-under-way.ts': 'what is under way of one job, for its branch’s writer',
  'network-reference.ts': 'sums of the network, with five others behind them',
  'network-state.ts': 'the cost book of the whole network',
  'photo-writer.ts': 'one branch for life',
  'quote-reference.ts': 'sums of the network, with five others behind them',
  'recompute.ts': 'the whole network, for tests',
  'restatement.ts': 'the whole network, before the switch',
  'signal-writer.ts': 'the nightly look at the whole network, and marks of one branch',
  'target-writer.ts': 'one branch for life, or the network’s own',
  'under-way-writer.ts': 'one branch for life',
  'queries/bookings.ts': 'writes of one branch',
  'queries/referrers.ts':
    'how much of the network refers to a row of the catalogue, for head office',
  'queries/set-up.ts': 'dated hourly costs, by head office',
  'queries/week-notes.ts': 'writes of one branch',
};

describe('The sources of db/', () => {
  const files = readdirSync(join(root, 'db'), { recursive: true, encoding: 'utf8' }).filter(
    (name) =>
      name.endsWith('.ts') &&
      !name.endsWith('.spec.ts') &&
      !name.startsWith('migrations') &&
      name !== 'tables.ts',
  );

  it('given a table of a branch named bare, do so only where it is listed here with a reason', () => {
    const names = [...SCOPED_TABLES, ...HANGING_TABLES.map(String)].join('|');
    const bare = new RegExp(
      `sql\\('(${names})( as \\w+)?'\\)|\\b(from|update|into)\\s+(${names})\\b|upsert\\(\\s*db,\\s*'(${names})'`,
    );
    const found = files.filter((name) => bare.test(readFileSync(join(root, 'db', name), 'utf8')));
    expect(found.sort()).toEqual(Object.keys(NAMED_BARE).sort());
  });
});

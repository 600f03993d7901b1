import type { Endpoint } from '#shared/contracts/endpoint';
import { ROLES, type Role } from '#shared/domain/vocabulary';
import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';
import { sendUpload } from '../support/send-upload';
import { addressOf, askedOf, contracts, nameOf, placeSamples } from '../support/walk-contracts';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  await placeSamples(app, network);
}, 30_000);
afterAll(() => app.stop());

const PEOPLE: Record<Role, 'recorder' | 'manager' | 'lead' | 'office'> = {
  recorder: 'recorder',
  site_manager: 'manager',
  regional_lead: 'lead',
  head_office: 'office',
};
/** Whether a call takes a JSON body; uploads are walked apart. */
const isJson = ({ body }: Endpoint): boolean => typeof body === 'object' && body !== null;
const tokenOf = (role: Role): string => network[PEOPLE[role]];
const rolesOf = ({ access }: Endpoint): readonly Role[] =>
  access === 'public' ? ROLES : access.roles;
const call = (
  endpoint: Endpoint,
  token: string | undefined,
  address = addressOf(endpoint),
): Promise<Answer> =>
  app.call(endpoint.method, address, { token, ...(isJson(endpoint) && { body: { zzz: 1 } }) });
const pathsIn = ({ body }: Answer): string[] =>
  ((body?.problems ?? []) as { path: string }[]).map(({ path }) => path);

const guarded = contracts.filter(([, { access }]) => access !== 'public');
const ofBranches = contracts.filter(([, { path }]) => path.includes(':branch'));

describe('The mounted calls', () => {
  it('given every contract, are exactly those, each once', () => {
    const mounted = app.mounted.map(nameOf).sort();
    expect(mounted).toEqual(contracts.map(([name]) => name).sort());
    expect(new Set(mounted).size).toBe(mounted.length);
    expect(mounted.length).toBeGreaterThan(40);
  });

  it('given their paths, name a branch :branch wherever its rows are meant', () => {
    for (const [name, { path, scope }] of contracts) {
      if (path.startsWith('/api/branches/:code/')) expect([name, scope]).toEqual([name, 'none']);
    }
  });
});

describe.each(guarded)('%s', (_, endpoint) => {
  it('given no token or one that is none, answers 401', async () => {
    for (const token of [undefined, 'nonsense', 'usk_0_0']) {
      const answer = await call(endpoint, token);
      expect([answer.status, answer.body.status]).toEqual([401, 401]);
      expect(answer.headers.get('www-authenticate')).toContain('Bearer');
    }
  });

  const refused = ROLES.filter((role) => !rolesOf(endpoint).includes(role));
  it(`given ${refused.join(', ') || 'no role that lacks it'}, answers 403 whatever the resource`, async () => {
    for (const role of refused) {
      for (const branch of ['AAA', 'BBB', 'ZZZ']) {
        const values = { branch, code: branch };
        const answer = await call(endpoint, tokenOf(role), addressOf(endpoint, values));
        expect([role, answer.status]).toEqual([role, 403]);
      }
    }
  });

  it('given a push key, answers 403 unless it is a call for keys', async () => {
    const { access } = endpoint;
    if (access === 'public') throw new Error('only guarded calls are walked here');
    const answer = await call(endpoint, network.keys['AAA']);
    if (access.pushKey) expect(answer.status).not.toBe(403);
    else expect(answer.status).toBe(403);
    // A key reaches no branch but its own; elsewhere even what it may send is not there.
    const elsewhere = await call(endpoint, network.keys['BBB']);
    expect(elsewhere.status).toBe(access.pushKey ? 404 : 403);
  });
});

describe.each(ofBranches)('%s', (_, endpoint) => {
  it('given a branch out of scope, answers 404 as for one that does not exist', async () => {
    const nowhere = { branch: 'ZZZ' };
    for (const role of rolesOf(endpoint)) {
      const outside = {
        recorder: 'BBB',
        site_manager: 'BBB',
        regional_lead: 'CCC',
        head_office: 'ZZZ',
      };
      const there = await call(
        endpoint,
        tokenOf(role),
        addressOf(endpoint, { branch: outside[role] }),
      );
      const none = await call(endpoint, tokenOf(role), addressOf(endpoint, nowhere));
      expect([role, there.status, there.text]).toEqual([role, 404, none.text]);
    }
  });
});

describe.each(contracts)('%s', (_, endpoint) => {
  const token = (): string => tokenOf(rolesOf(endpoint).at(-1)!);

  it('given an unknown query parameter, answers 422 and names it (rule 60)', async () => {
    const address = `${addressOf(endpoint)}?zzz=1&__proto__=1`;
    const { body, method } = endpoint;
    // Of an upload the type is judged first (rule 82).
    const answer =
      typeof body === 'string'
        ? await sendUpload(app, body, method, address, token())
        : await call(endpoint, token(), address);
    expect(answer.status).toBe(422);
    expect(pathsIn(answer)).toEqual(expect.arrayContaining(['/query/zzz', '/query/__proto__']));
  });

  if (isJson(endpoint)) {
    it('given an unknown field, answers 422 and names it (rule 57)', async () => {
      const answer = await call(endpoint, token());
      expect([answer.status, pathsIn(answer)]).toEqual([422, expect.arrayContaining(['/zzz'])]);
    });

    it('given no JSON or another type, answers 400 or 415 as a problem', async () => {
      const send = (body: string, type: string): Promise<Answer> =>
        app.call(endpoint.method, addressOf(endpoint), {
          token: token(),
          body,
          headers: { 'content-type': type },
        });
      for (const [body, type, status] of [
        ['{', 'application/json', 400],
        ['a=1', 'application/x-www-form-urlencoded', 415],
        ['{}', 'text/plain', 415],
      ] as const) {
        const answer = await send(body, type);
        expect([answer.status, answer.body.status]).toEqual([status, status]);
        expect(answer.headers.get('content-type')).toContain('application/problem+json');
      }
    });
  }

  if (typeof endpoint.body === 'string') {
    it('given JSON instead of an upload, answers 415 as a problem', async () => {
      const answer = await app.call(endpoint.method, addressOf(endpoint), {
        token: token(),
        body: { zzz: 1 },
      });
      expect([answer.status, answer.body.status]).toEqual([415, 415]);
    });
  }

  if (endpoint.method === 'get') {
    it('given nothing wrong, answers 200 to every role that has it and keeps nothing', async () => {
      for (const role of rolesOf(endpoint)) {
        const answer = await call(endpoint, tokenOf(role), askedOf(endpoint));
        expect([role, answer.status]).toEqual([role, 200]);
        expect(answer.headers.get('cache-control')).toBe('no-store');
      }
    });
  }
});

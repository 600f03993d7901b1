import { sql } from '#db/database';
import { PASSWORD, TestApp, type Answer } from '../support/app';

let app: TestApp;
beforeEach(async () => {
  app = await TestApp.start();
});
afterEach(() => app.stop());

const EMAIL = 'ansa@network.example';
interface Mail {
  to: string;
  subject: string;
  text: string;
}
/** What waits in the local mailbox, as the table has it: signing in to read it would add a sign-in. */
const mails = (): Mail[] =>
  app.kit.store.unscoped.all<Mail>(
    sql('mails').orderBy('id').select('subject', { to: 'recipient', text: 'text_body' }),
  );
async function signInFrom(device: string, email = EMAIL): Promise<string> {
  const answer = await app.call('post', '/api/auth/sign-in', {
    body: { email, password: PASSWORD },
    headers: { 'user-agent': device },
  });
  return (answer.body as { accessToken: string }).accessToken;
}
const choose = (token: string, items: unknown): Promise<Answer> =>
  app.call('put', '/api/auth/mails', { token, body: { items } });

describe('A sign-in from a device not seen before', () => {
  it('given the very first sign-in and the same device again, mails nothing', async () => {
    await app.signIn(EMAIL, 'head_office');
    await signInFrom('node');
    expect(mails()).toEqual([]);
  });

  it('given another device, mails when and from where, and what to do', async () => {
    await app.signIn(EMAIL, 'head_office');
    await signInFrom('Tablet/7.1 (workshop)');
    const [mail, ...more] = mails();
    expect(more).toEqual([]);
    expect(mail).toMatchObject({ to: EMAIL, subject: 'A new sign-in to Underseam' });
    expect(mail?.text).toMatch(/on \d{4}-\d\d-\d\d at \d\d:\d\d UTC from a device/);
    expect(mail?.text).toContain('Tablet/7.1 (workshop), network address');
    expect(mail?.text).toContain('sign out everywhere');
    expect(mail?.text).toContain('/account\n');
    // Known from now on, and still when its browser has been updated.
    await signInFrom('Tablet/7.1 (workshop)');
    await signInFrom('Tablet/8.0.2 (workshop)');
    expect(mails()).toHaveLength(1);
  });

  it('given somebody who does without that mail, mails nothing and sends it when wanted again', async () => {
    const token = await app.signIn(EMAIL, 'head_office');
    await choose(token, [{ kind: 'new_sign_in', wanted: false }]);
    await signInFrom('Tablet');
    expect(mails()).toEqual([]);
    await choose(token, [{ kind: 'new_sign_in', wanted: true }]);
    await signInFrom('Phone');
    expect(mails()).toHaveLength(1);
  });

  it('given sign-ins that ended over 90 days ago, lets go of them and of no other', async () => {
    await app.signIn(EMAIL, 'head_office');
    await signInFrom('node');
    const { unscoped } = app.kit.store;
    const long = new Date(Date.now() - 91 * 24 * 3600_000).toISOString();
    const lately = new Date(Date.now() - 89 * 24 * 3600_000).toISOString();
    await app.kit.store.queue.write(() => {
      unscoped.run(sql('sign_ins').where({ id: 1 }).update({ ended_at: long }));
      unscoped.run(sql('sign_ins').where({ id: 2 }).update({ ended_at: lately }));
    });
    await signInFrom('node');
    expect(unscoped.all(sql('sign_ins').orderBy('id').select('id'))).toEqual([
      { id: 2 },
      { id: 3 },
    ]);
  });
});

describe('The choice of mails', () => {
  it('given head office, lists what they can receive, wanted until they say otherwise', async () => {
    const token = await app.signIn(EMAIL, 'head_office');
    const { body } = await app.call('get', '/api/auth/mails', { token });
    expect(body.items).toEqual([
      { kind: 'new_sign_in', wanted: true },
      { kind: 'import_ended', wanted: true },
      { kind: 'warranty_report', wanted: true },
      { kind: 'month_digest', wanted: true },
    ]);
    const chosen = await choose(token, [{ kind: 'import_ended', wanted: false }]);
    expect(chosen.body.items).toEqual([
      { kind: 'new_sign_in', wanted: true },
      { kind: 'import_ended', wanted: false },
      { kind: 'warranty_report', wanted: true },
      { kind: 'month_digest', wanted: true },
    ]);
    const { body: trail } = await app.call('get', '/api/audit?action=person.mails', { token });
    expect(trail.items[0].changes).toEqual([{ path: '/import_ended', before: true, after: false }]);
  });

  it('given a role that does not receive a kind, neither lists nor takes it', async () => {
    const office = await app.signIn('office@network.example', 'head_office');
    await app.call('put', '/api/regions/COAST', { token: office, body: { name: 'Coast' } });
    const token = await app.signIn(EMAIL, 'regional_lead', { regions: ['COAST'] });
    const { body } = await app.call('get', '/api/auth/mails', { token });
    expect(body.items).toEqual([
      { kind: 'new_sign_in', wanted: true },
      { kind: 'region_digest', wanted: true },
    ]);
    const refused = await choose(token, [
      { kind: 'new_sign_in', wanted: false },
      { kind: 'import_ended', wanted: true },
      { kind: 'warranty_report', wanted: true },
      { kind: 'month_digest', wanted: true },
    ]);
    expect([refused.status, refused.body.problems[0].path]).toEqual([422, '/items/1/kind']);
    expect((await app.call('get', '/api/auth/mails', { token })).text).toContain('true');
  });

  it('given a file worked through, mails whoever sent it unless they do without', async () => {
    const token = await app.signIn(EMAIL, 'head_office');
    const end = (): Promise<void> =>
      app.kit.store.queue.write(() =>
        app.kit.outbox.queueImportEnded(1, {
          branch: 'AAA',
          fileName: 'week 5.csv',
          outcome: 'written',
          counts: ['12 new', '3 refused'],
          path: '/import',
        }),
      );
    await end();
    expect(mails()[0]?.text).toContain('The file week 5.csv of AAA: written. 12 new, 3 refused.');
    await choose(token, [{ kind: 'import_ended', wanted: false }]);
    await end();
    expect(mails()).toHaveLength(1);
  });
});

describe('A changed password', () => {
  it('given the own page, tells the person by mail', async () => {
    const token = await app.signIn(EMAIL, 'head_office');
    const body = { currentPassword: PASSWORD, newPassword: 'another long password' };
    expect((await app.call('post', '/api/auth/password', { token, body })).status).toBe(204);
    expect(mails()).toMatchObject([
      { to: EMAIL, subject: 'Your password for Underseam was changed' },
    ]);
  });
});

describe('An invitation mailed again', () => {
  it('given somebody invited, makes the earlier link worthless; given a password, answers 409', async () => {
    const token = await app.signIn('office@network.example', 'head_office');
    const given = { email: EMAIL, name: 'Ansa', role: 'head_office' };
    const { id } = (await app.call('post', '/api/people', { token, body: given })).body as {
      id: number;
    };
    const again = (): Promise<Answer> =>
      app.call('post', `/api/people/${id}/invitation`, { token });
    expect((await again()).status).toBe(204);
    const [first, second] = mails().map(({ text }) => /token=([\w-]+)/.exec(text)?.[1]);
    const redeem = async (link: string | undefined): Promise<number> => {
      const body = { token: link, newPassword: PASSWORD };
      return (await app.call('post', '/api/auth/set-password', { body })).status;
    };
    expect(await redeem(first)).toBe(422);
    expect(await redeem(second)).toBe(204);
    const refused = await again();
    expect([refused.status, refused.body.detail]).toEqual([
      409,
      expect.stringContaining('password already'),
    ]);
    expect((await app.call('post', '/api/people/99/invitation', { token })).status).toBe(404);
    const { body: trail } = await app.call('get', '/api/audit?action=person.invite', { token });
    expect(trail.items).toMatchObject([{ subject: `/people/${id}`, detail: { to: EMAIL } }]);
  });

  it('given somebody turned off, answers 409', async () => {
    const token = await app.signIn('office@network.example', 'head_office');
    const given = { email: EMAIL, name: 'Ansa', role: 'head_office' };
    const { id } = (await app.call('post', '/api/people', { token, body: given })).body as {
      id: number;
    };
    const off = { name: 'Ansa', role: 'head_office', active: false };
    await app.call('put', `/api/people/${id}`, { token, body: off });
    const refused = await app.call('post', `/api/people/${id}/invitation`, { token });
    expect([refused.status, mails().length]).toEqual([409, 1]);
  });
});

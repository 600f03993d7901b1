import { sql } from '#db/database';
import { DigestRuns } from '#server/schedule/digest-runs';
import pino from 'pino';
import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

interface Mail {
  to: string;
  subject: string;
  text: string;
  html: string;
}

const log = pino({ level: 'silent' });
let app: TestApp;
let people: SmallNetwork;
let now: string;
let runs: DigestRuns;

beforeEach(async () => {
  app = await TestApp.start();
  people = await makeSmallNetwork(app);
  now = '2026-02-02T13:00:00Z';
  runs = new DigestRuns({ ...app.kit, clock: { now: () => new Date(now) } }, log);
});
afterEach(() => app.stop());

const db = () => app.kit.store.unscoped;
const mails = (): Mail[] =>
  db().all<Mail>(
    sql('mails')
      .orderBy('id')
      .select('subject', { to: 'recipient', text: 'text_body', html: 'html_body' }),
  );
const to = (name: string) => mails().filter((mail) => mail.to === `${name}@network.example`);
const write = (work: () => void) => app.kit.store.queue.write(work);
const putJob = (branch = 'AAA', over: Record<string, unknown> = {}) =>
  app.call('put', `/api/branches/${branch}/jobs/${branch}-1`, {
    token: people.office,
    body: validJob(over),
  });
const branchId = (code: string) =>
  db().first<{ id: number }>(sql('branches').where({ code }).select('id'))!.id;
const silence = (code: string, openedOn: string, overOn: string | null = null) =>
  write(() => {
    db().run(
      sql('signals').insert({
        branch_id: branchId(code),
        kind: 'silence',
        key: openedOn,
        since: openedOn,
        opened_on: openedOn,
        last_seen_on: openedOn,
        over_on: overOn,
        strength: 1,
        facts: JSON.stringify({ lastReceivedOn: openedOn, quietDays: 8, usualDays: 3 }),
        cars: 0,
        job_refs: '[]',
      }),
    );
  });
const look = (day: string, at = `${day}T04:00:00.000Z`) =>
  write(() => {
    db().run(sql('signal_looks').insert({ day, at, opened: 0, ended: 0 }));
  });
const kinds = () =>
  db()
    .all<{ kind: string; period: string }>(
      sql('digest_runs').orderBy(['kind', 'period']).select('kind', 'period'),
    )
    .map(({ kind, period }) => `${kind} ${period}`);

describe('Digests of a Monday', () => {
  it('given a week with a car, tell its manager what it kept and the link that stops them, once', async () => {
    await putJob();
    await runs.check();
    await runs.check();
    const [mail, ...more] = to('manager');
    expect(more).toEqual([]);
    expect(mail?.subject).toBe('Week 5, 2026: Branch AAA');
    // 870.00 less 441.00 of labour, 50.40 of product, 2.70 of clips and 43.50 of fee.
    expect(mail?.text).toContain('Week 5 kept 38\u202f% of what it billed (1 car)');
    expect(mail?.text).toContain(
      'Labour ran 5\u202fh 30\u202fmin over its estimates (1 car), most of all in repair (+3\u202fh 5\u202fmin).',
    );
    expect(mail?.text).toContain('Nothing waits');
    expect(mail?.text).toMatch(/\/unsubscribe\?token=\S+/);
    expect(mail?.html).toContain('<table');
    expect(kinds()).toContain('monday_digest 2026-W05');
  });

  it('given nothing finished and nothing open, mail nobody and are done all the same', async () => {
    await runs.check();
    expect(mails()).toEqual([]);
    expect(kinds()).toEqual([
      'monday_digest 2026-W05',
      'month_digest 2026-01',
      'region_digest 2026-W05',
    ]);
  });

  it('given several branches, tell each in a block of one mail and no other branch', async () => {
    await app.signIn('two@network.example', 'site_manager', { branches: ['AAA', 'BBB'] });
    for (const branch of ['AAA', 'BBB', 'CCC']) await putJob(branch);
    await runs.check();
    expect(to('two')).toHaveLength(1);
    expect(to('two')[0]!.text).toMatch(/Branch AAA, Week 5, 2026\n[^]*Branch BBB, Week 5, 2026\n/);
    expect(to('two')[0]!.text).not.toContain('CCC');
    expect(to('manager')[0]!.text).not.toContain('BBB');
  });

  it('before the day’s look at signals wait for it until noon', async () => {
    await putJob();
    now = '2026-02-02T06:30:00Z';
    await runs.check();
    expect(kinds()).toEqual([]);
    await look('2026-02-02');
    await runs.check();
    expect(kinds()).toHaveLength(3);
  });

  it('before the last branch’s Sunday is over, nothing; after downtime until Thursday, on Friday no more', async () => {
    await write(() => {
      db().run(sql('branches').where({ code: 'HHH' }).update({ time_zone: 'Pacific/Honolulu' }));
      app.kit.store.state.reload();
    });
    await putJob();
    now = '2026-02-08T23:59:00Z';
    await runs.check();
    expect(kinds().filter((run) => run.includes('W06'))).toEqual([]);
    now = '2026-02-13T13:00:00Z';
    await runs.check();
    expect(kinds().filter((run) => run.includes('W06'))).toEqual([]);
    now = '2026-02-12T13:00:00Z';
    await runs.check();
    expect(kinds().filter((run) => run.includes('W06'))).toHaveLength(2);
  });

  it('through a year with both changes of the clock, run once a week and once a month', async () => {
    for (let day = 0; day < 371; day += 1) {
      now = new Date(Date.UTC(2026, 0, 5 + day, 13)).toISOString();
      await runs.check();
    }
    const weeks = kinds().filter((run) => run.startsWith('monday_digest'));
    expect(weeks).toHaveLength(53);
    expect(new Set(weeks).size).toBe(53);
    expect(kinds().filter((run) => run.startsWith('month_digest'))).toHaveLength(13);
  }, 60_000);

  it('given people who do without, are turned off, invited or of another role, mail none of them', async () => {
    await putJob();
    await app.call('put', '/api/auth/mails', {
      token: people.manager,
      body: { items: [{ kind: 'monday_digest', wanted: false }] },
    });
    const body = { name: 'New', role: 'site_manager', branches: ['AAA'] };
    await app.call('post', '/api/people', {
      token: people.office,
      body: { ...body, email: 'new@network.example' },
    });
    await app.signIn('off@network.example', 'site_manager', { branches: ['AAA'] });
    await write(() =>
      db().run(sql('people').where({ email: 'off@network.example' }).update({ active: 0 })),
    );
    await runs.check();
    const weeks = mails().filter(({ subject }) => subject.startsWith('Week'));
    expect(weeks).toEqual([]);
  });

  it('given somebody moved while digests are made, tell them of where they are now', async () => {
    await putJob('AAA');
    await putJob('BBB');
    const { reads } = app.kit;
    const answer = reads.answer.bind(reads);
    let moved = false;
    reads.answer = async (name, scope, input) => {
      const answered = await answer(name, scope, input);
      if (!moved && name === 'digestWeek') {
        moved = true;
        await write(() =>
          db().run(
            sql('person_branches')
              .where({ branch_id: branchId('AAA') })
              .update({ branch_id: branchId('BBB') }),
          ),
        );
      }
      return answered;
    };
    await runs.check();
    expect(to('manager').map(({ subject }) => subject)).toEqual(['Week 5, 2026: Branch BBB']);
  });
});

describe('Digests of regions', () => {
  it('given a new signal, tell the lead of that region alone, in the words of the page', async () => {
    await silence('AAA', '2026-01-30');
    await silence('CCC', '2026-01-30');
    await runs.check();
    const [mail] = to('lead');
    expect(mail?.subject).toBe('Your regions since 26 January 2026: 1 new signal, 0 over');
    expect(mail?.text).toContain('No jobs arrive from Branch AAA.');
    expect(mail?.text).toContain('Branch AAA has sent no job since 30 January 2026');
    expect(mail?.text).not.toContain('CCC');
  });

  it('given nothing new, over, silent or late, mail no lead', async () => {
    await silence('AAA', '2026-01-05', '2026-01-12');
    await putJob();
    await runs.check();
    expect(to('lead')).toEqual([]);
  });

  it('the Monday after, tell what came after the look told of last, and nothing twice', async () => {
    await silence('AAA', '2026-02-02');
    await look('2026-02-02', new Date(Date.now() - 60_000).toISOString());
    await runs.check();
    await silence('BBB', '2026-02-03');
    now = '2026-02-09T13:00:00Z';
    await runs.check();
    const second = to('lead')[1];
    expect(second?.subject).toBe('Your regions since 3 February 2026: 1 new signal, 0 over');
    expect(second?.text).toMatch(/New:\n- [^\n]*Branch BBB[^\n]*\n\n/);
  });
});

describe('The digest of a month', () => {
  it('given cars, tells head office by region what they kept; caught up with until the 7th', async () => {
    await putJob('AAA');
    await putJob('CCC');
    now = '2026-02-08T13:00:00Z';
    await runs.check();
    expect(to('office')).toEqual([]);
    now = '2026-02-07T13:00:00Z';
    await runs.check();
    const [mail] = to('office');
    expect(mail?.subject).toBe('The network in January 2026');
    expect(mail?.text).toContain(
      '2 cars were finished in January 2026; 2 billed cars kept 38\u202f% of what they billed.',
    );
    expect(mail?.text).toMatch(/Coast {2,}38\u202f% +1 car/);
    expect(mail?.text).toContain('No warranty-risk report was issued.');
  });
});

import { TestApp, type Answer } from '../support/app';
import { confirmFile, sendFile } from '../support/send-file';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
  await app.call('put', '/api/network', {
    token: network.office,
    body: { name: 'Small', currency: 'EUR', feeRate: 0.05, claimLimitCents: 20_000 },
  });
  await app.call('put', '/api/branches/AAA/jobs/J-1', {
    token: network.manager,
    body: validJob({ completedOn: '2026-01-28' }),
  });
}, 120_000);
afterAll(() => app.stop());

const send = (content: string, token: string): Promise<Answer> =>
  sendFile(app, token, { kind: 'claims', content });
const claim = async (ref: string): Promise<Answer['body']> =>
  (await app.call('get', `/api/branches/AAA/claims/${ref}`, { token: network.manager })).body;

const HEADINGS = 'Claim;Job;Made on;Zone;Cause;Decision;Decided on;Labour;ml;Cost;Paid on;Note';

describe('A file of claims', () => {
  it('given good and bad rows, writes the good ones and says what is wrong with the others', async () => {
    const content = [
      HEADINGS,
      'C-1;J-1;29.01.2026;Sill inner;Thin coverage;accepted;30.01.2026;1:30;500;120,50;30.01.2026;ok',
      'C-2;J-9;29.01.2026;floor;damage;open;;;;;;',
      'C-3;J-1;27.01.2026;roof;damage;open;;;;;30.01.2026;',
    ].join('\n');
    const sent = await send(content, network.manager);
    expect(sent.body).toMatchObject({ kind: 'claims', counts: { rows: 3, new: 1, refused: 2 } });
    const [unknown, wrong] = sent.body.refusedPreview;
    expect(unknown.problems).toEqual([
      { heading: 'Job', message: 'no job of this branch has this reference' },
    ]);
    expect(wrong.problems.map(({ heading }: { heading: string }) => heading).sort()).toEqual([
      'Made on',
      'Paid on',
      'Zone',
    ]);
    await confirmFile(app, network.manager, sent.body.id);
    expect(await claim('C-1')).toMatchObject({
      zone: 'sill_inner',
      cause: 'thin_coverage',
      decision: 'accepted',
      labourMinutes: 90,
      costCents: 12_050,
      paidOn: '2026-01-30',
    });
    expect((await send(content, network.manager)).body.counts).toMatchObject({ unchanged: 1 });
    const few = await send('claim;note;side\nC-1;better;Left\n', network.manager);
    await confirmFile(app, network.manager, few.body.id);
    expect(await claim('C-1')).toMatchObject({
      ...{ note: 'better', side: 'left', costCents: 12_050, revision: 2 },
    });
  });

  it('given a decision above the limit, keeps a manager’s as a proposal and takes that of head office (rule 77)', async () => {
    const content = `${HEADINGS}\nC-5;J-1;29.01.2026;floor;damage;accepted;30.01.2026;;;200,01;;\n`;
    const sent = await send(content, network.manager);
    await confirmFile(app, network.manager, sent.body.id);
    expect(await claim('C-5')).toMatchObject({ decision: 'open', proposedDecision: 'accepted' });
    const decided = await send(content, network.office);
    expect(decided.body.counts).toMatchObject({ changed: 1 });
    await confirmFile(app, network.office, decided.body.id);
    expect((await claim('C-5')).decision).toBe('accepted');
  });
});

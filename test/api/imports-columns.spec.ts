import type { ImportColumn } from '#shared/contracts/imports';
import { TestApp, type Answer } from '../support/app';
import { confirmFile, endOf, sendFile } from '../support/send-file';
import { makeSmallNetwork, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
}, 120_000);
afterAll(() => app.stop());

const send = (content: string, token = network.manager, branch = 'AAA'): Promise<Answer> =>
  sendFile(app, token, { content, branch });
const change = async (sent: Answer, body: unknown): Promise<Answer> => {
  const { id } = sent.body as { id: string };
  const path = `/api/branches/AAA/imports/${id}`;
  const answer = await app.call('put', path, { token: network.manager, body });
  return answer.status === 200 ? endOf(app, network.manager, id) : answer;
};
const fieldsOf = (sent: Answer): (string | null)[] =>
  (sent.body.columns as ImportColumn[]).map(({ field }) => field);

const OWN = 'Auftrag,make,model,body,registered,package,Fertig,Grundzeit,comment\n';
const ROW = 'O-1,A,B,van,01/2010,full,02/03/2025,10,x\n';

describe('What the columns of a file mean', () => {
  it('given by a person, is checked anew and remembered for the next file of the branch', async () => {
    const sent = await send(OWN + ROW);
    expect(fieldsOf(sent)).toEqual([
      ...[null, 'vehicle.make', 'vehicle.model', 'vehicle.bodyType', 'vehicle.firstRegistered'],
      ...['package', null, null, 'notes'],
    ]);
    expect(sent.body.missingFields).toEqual(['jobRef', 'completedOn']);
    expect(sent.body.counts).toMatchObject({ refused: 1 });
    const columns = [
      { index: 0, field: 'jobRef' },
      { index: 6, field: 'completedOn' },
      { index: 7, field: 'actual.strip' },
      { index: 8, field: null },
    ];
    const { options } = sent.body;
    const changed = await change(sent, { options: { ...options, dateOrder: 'mdy' }, columns });
    expect(changed.body).toMatchObject({ state: 'ready', counts: { new: 1, refused: 0 } });
    await confirmFile(app, network.manager, sent.body.id);
    const job = await app.call('get', '/api/branches/AAA/jobs/O-1', { token: network.manager });
    expect(job.body).toMatchObject({ completedOn: '2025-02-03', notes: '' });

    const next = await send('make,AUFTRAG,fertig,comment\nA,O-1,2025-02-04,x\n');
    expect(next.body.columns).toMatchObject([
      { field: 'vehicle.make', chosen: false, examples: ['A'] },
      { field: 'jobRef', chosen: true },
      { field: 'completedOn', chosen: true },
      { field: null, chosen: true },
    ]);
    const elsewhere = await send('make,Auftrag\nA,O-1\n', network.office, 'BBB');
    expect(fieldsOf(elsewhere)).toEqual(['vehicle.make', null]);
  });

  it('given two columns for one thing, an unknown field or no such column, answers 422 and names each', async () => {
    const sent = await send('job,price,a\nA,1,2\n');
    const columns = [
      { index: 2, field: 'estimate.priceCents' },
      { index: 7, field: 'notes' },
      { index: 0, field: 'constructor' },
    ];
    const answer = await change(sent, { options: sent.body.options, columns });
    expect(answer.status).toBe(422);
    expect(answer.body.problems.map(({ path }: { path: string }) => path).sort()).toEqual([
      '/columns',
      '/columns/1/index',
      '/columns/2/field',
    ]);
  });

  it('given another delimiter, finds its columns anew', async () => {
    const sent = await send('job;make\nA;B\n');
    const options = { ...sent.body.options, delimiter: ',' };
    const answer = await change(sent, { options, columns: [{ index: 1, field: null }] });
    expect((answer.body.columns as ImportColumn[]).map(({ heading }) => heading)).toEqual([
      'job;make',
    ]);
  });

  it('given once it was written, cannot be changed (409)', async () => {
    const sent = await send(
      'job,make,model,body,registered,package,completed,strip\nD-1,A,B,van,2010-01,full,2026-01-28,1\n',
    );
    await confirmFile(app, network.manager, sent.body.id);
    const answer = await change(sent, { options: sent.body.options, columns: [] });
    expect(answer.status).toBe(409);
    const again = await confirmFile(app, network.manager, sent.body.id);
    expect(again.status).toBe(409);
  });
});

describe('A file of another branch', () => {
  it('given its id, is not there (404), and a recorder has no such call (403)', async () => {
    const sent = await send('job,make\nA,B\n', network.office, 'CCC');
    const { id } = sent.body;
    for (const [method, tail] of [
      ['get', ''],
      ['post', '/confirm'],
      ['post', '/cancel'],
      ['get', '/refused.csv'],
    ] as const) {
      for (const branch of ['AAA', 'CCC']) {
        const path = `/api/branches/${branch}/imports/${id}${tail}`;
        expect((await app.call(method, path, { token: network.manager })).status).toBe(404);
        expect((await app.call(method, path, { token: network.recorder })).status).toBe(403);
      }
      const wrong = `/api/branches/AAA/imports/${id}${tail}`;
      expect((await app.call(method, wrong, { token: network.office })).status).toBe(404);
    }
    expect((await sendFile(app, network.recorder, { content: 'job\nA\n' })).status).toBe(403);
    expect(
      (await sendFile(app, network.manager, { branch: 'BBB', content: 'job\nA\n' })).status,
    ).toBe(404);
    const list = await app.call('get', '/api/branches/AAA/imports', { token: network.manager });
    expect((list.body.items as { branch: string }[]).every(({ branch }) => branch === 'AAA')).toBe(
      true,
    );
    expect(JSON.stringify(list.body)).not.toContain(id);
  });
});

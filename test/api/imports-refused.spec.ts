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

const send = (content: string | Uint8Array, name = 'file.csv'): Promise<Answer> =>
  sendFile(app, network.manager, { content, name });
const refused = async (id: string): Promise<Answer> =>
  app.call('get', `/api/branches/AAA/imports/${id}/refused.csv`, { token: network.manager });

const HEADINGS =
  'Job;Make;Model;Body;Registered;Package;Started;Completed;Strip minutes;Price;Notes';

describe('Rows that are refused', () => {
  it('given everything wrong with a row, tells all of it at once by the headings of the file', async () => {
    const row = 'B-1;;Tessock;boat;2009-05;fll;2026-01-29;28.01.2026;ninety;12,345;';
    const late = 'B-2;V;T;van;2030-01;full;;2030-01-01;10;1;';
    const ragged = 'B-3;V;T;van;2010-01;full;;2026-01-28;10;1;a;b;c';
    const sent = await send([HEADINGS, row, late, ragged, ';V'].join('\n'));
    const [first, second, third, fourth] = sent.body.refusedPreview;
    expect(first).toMatchObject({ line: 2, ref: 'B-1', status: 'refused' });
    expect(first.problems).toEqual(
      expect.arrayContaining([
        { heading: 'Make', message: 'is empty, but needed' },
        expect.objectContaining({ heading: 'Body', message: expect.stringContaining('"boat"') }),
        expect.objectContaining({
          heading: 'Package',
          message: expect.stringContaining('full (Full)'),
        }),
        { heading: 'Started', message: 'is after "Completed" (2026-01-28)' },
        { heading: 'Completed', message: 'is before "Started" (2026-01-29)' },
        expect.objectContaining({ heading: 'Strip minutes' }),
        { heading: 'Price', message: '"12,345" has more than two decimals' },
      ]),
    );
    expect(first.problems).toHaveLength(7);
    expect(second.problems).toContainEqual(
      expect.objectContaining({ heading: 'Completed', message: expect.stringContaining('future') }),
    );
    expect(third.problems[0].message).toContain('13 cells');
    expect(fourth.problems).toEqual([{ heading: 'Job', message: 'is empty, but needed' }]);
  });

  it('given as a download, come back mended, formulas defused on the way out and as they were on the way in', async () => {
    const good = '"A;1";Velder;Tessock;van;2010-01;full;;2026-01-28;10;-5;=SUM(A1)';
    const sent = await send([HEADINGS, good].join('\r\n'));
    expect(sent.body.counts).toMatchObject({ rows: 1, refused: 1 });
    const download = await refused(sent.body.id);
    expect(download.headers.get('content-disposition')).toContain('refused-jobs.csv');
    const [head, row, end] = download.text.split('\r\n');
    expect(head).toBe(`${HEADINGS};why refused`);
    expect(row).toBe(
      `"A;1";Velder;Tessock;van;2010-01;full;;2026-01-28;10;-5;'=SUM(A1);Price: must be at least 0`,
    );
    expect(end).toBe('');
    const again = await send(download.text.replace(';-5;', ';5;'));
    expect(again.body.columns.at(-1)).toMatchObject({ heading: 'why refused', field: null });
    expect(again.body.counts).toMatchObject({ new: 1, refused: 0 });
    await confirmFile(app, network.manager, again.body.id);
    const job = await app.call('get', '/api/branches/AAA/jobs/A%3B1', { token: network.manager });
    expect(job.body).toMatchObject({ notes: '=SUM(A1)', estimate: { priceCents: 500 } });
    const second = await refused((await send(download.text)).body.id);
    expect(second.text.split('\r\n').slice(0, 2)).toEqual([head, row]);
  });
});

describe('A file that is none', () => {
  const at = (sent: Answer): unknown => [sent.status, sent.body.problems?.[0]];
  const XLSX = Buffer.concat([Buffer.from('PK\u0003\u0004'), Buffer.alloc(200)]);
  const OLE = Buffer.concat([Buffer.from('d0cf11e0a1b11ae1', 'hex'), Buffer.alloc(600)]);
  it.each([
    ['a workbook', XLSX, 'workbook'],
    ['an old workbook', OLE, 'workbook'],
    ['UTF-16', Buffer.from('\uFEFFjob,make\nA,B\n', 'utf16le'), 'UTF-16'],
    ['zero bytes', Buffer.from('job,make\nA,\0\n'), 'no text file'],
    ['nothing', Buffer.alloc(0), 'empty'],
    ['spaces only', Buffer.from(' \r\n\r\n '), 'empty'],
  ])('given %s, is refused with what to do', async (_, content, said) => {
    const sent = await send(content, 'jobs.xlsx');
    expect(at(sent)).toEqual([422, { path: '/file', message: expect.stringContaining(said) }]);
  });

  it.each([
    ['headings only', 'job,make,model\n', 'no row below'],
    ['a quote that is never closed', 'job,make\nA,B\nC,"D\nE,F\n', 'after line 2'],
    ['one line of several megabytes', `job,make\nA,${'x'.repeat(3_000_000)}\n`, 'longer than 1 MB'],
    ['headings of several megabytes', `job,${'x'.repeat(3_000_000)}\nA,B\n`, 'No row of headings'],
    ['two thousand columns', `${'a,'.repeat(2000)}\n1\n`, 'columns'],
  ])('given %s, fails with a sentence', async (_, content, said) => {
    const sent = await send(content);
    expect([sent.status, sent.body.state]).toEqual([201, 'failed']);
    expect(sent.body.problem).toContain(said);
    const confirmed = await confirmFile(app, network.manager, sent.body.id);
    expect(confirmed.status).toBe(409);
    expect((await refused(sent.body.id)).status).toBe(200);
  });

  it('given headings twice, takes the first of each and says so by its columns', async () => {
    const sent = await send('job,make,make,Model,model\nA,B,C,D,E\n');
    expect(sent.body.columns.map(({ field }: { field: string | null }) => field)).toEqual([
      'jobRef',
      'vehicle.make',
      null,
      'vehicle.model',
      null,
    ]);
  });

  it('given letters that are no UTF-8 in a file read as UTF-8, refuses their rows', async () => {
    const sent = await send(Buffer.from('job,make\nA,M\u00fc\n', 'latin1'));
    expect(sent.body.options.encoding).toBe('windows-1252');
    await app.call('put', `/api/branches/AAA/imports/${sent.body.id}`, {
      token: network.manager,
      body: { options: { ...sent.body.options, encoding: 'utf-8' }, columns: [] },
    });
    const answer = await endOf(app, network.manager, sent.body.id);
    expect(answer.body.refusedPreview[0].problems).toContainEqual(
      expect.objectContaining({
        heading: 'make',
        message: expect.stringContaining('Windows-1252'),
      }),
    );
  });

  it('given a form without a file, or no form, is refused', async () => {
    const path = '/api/branches/AAA/jobs/file';
    const none = await app.call('post', path, { token: network.manager, body: {} });
    expect(none.status).toBe(415);
    const response = await fetch(app.url + path, {
      method: 'POST',
      headers: { authorization: `Bearer ${network.manager}` },
      body: new FormData(),
    });
    expect([400, 422]).toContain(response.status);
  });
});

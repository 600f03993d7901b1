import type { PreviewRow } from '#shared/contracts/imports';
import { TestApp, type Answer } from '../support/app';
import { confirmFile, sendFile, type SentFile } from '../support/send-file';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeSmallNetwork(app);
}, 120_000);
afterAll(() => app.stop());

const send = (content: SentFile['content'], more: Partial<SentFile> = {}): Promise<Answer> =>
  sendFile(app, network.manager, { content, ...more });
const confirm = (sent: Answer): Promise<Answer> => confirmFile(app, network.manager, sent.body.id);
const job = async (ref: string): Promise<Answer['body']> =>
  (await app.call('get', `/api/branches/AAA/jobs/${ref}`, { token: network.manager })).body;
const counts = (sent: Answer): unknown => sent.body?.counts;
const HEADINGS =
  'Job reference;Make;Model;Body type;First registered;Package;Completed on;Price;estimate.strip;strip minutes;actual.stages.repair;product CW1 ml;Invoice total;Invoice date';

/** Letters of Western Europe, a byte each. */
const windows1252 = (text: string): Uint8Array => Buffer.from(text, 'latin1');

describe('A file of jobs', () => {
  it('given semicolons, Windows-1252, decimal commas and days first, is read so and written exactly', async () => {
    const sent = await send(
      windows1252(
        [
          HEADINGS,
          'W-1;Velder;Tessöck;Hatchback;05/2009;Full;28.01.2026;1.780,50;1:30;110;0;4.200;870,05;29.01.2026',
          'W-2;Velder;"Ono; Größe";SUV;2015-03;cavity;27.01.2026;;;95;;;;',
        ].join('\r\n'),
      ),
    );
    expect(sent.status).toBe(201);
    expect(sent.body).toMatchObject({
      state: 'ready',
      options: { delimiter: ';', encoding: 'windows-1252', decimal: ',', dateOrder: 'dmy' },
      counts: { rows: 2, new: 2, changed: 0, unchanged: 0, refused: 0 },
      missingFields: [],
      progress: { done: 2, of: 2 },
    });
    expect(sent.body.preview[1]).toMatchObject({ line: 3, ref: 'W-2', status: 'new' });
    expect((await job('W-1')).status).toBe(404);
    const done = await confirm(sent);
    expect(done.body).toMatchObject({
      state: 'done',
      written: { created: 2, replaced: 0, unchanged: 0, refused: 0 },
    });
    expect(await job('W-1')).toMatchObject({
      vehicle: {
        make: 'Velder',
        model: 'Tessöck',
        bodyType: 'hatchback',
        firstRegistered: '2009-05',
      },
      package: 'full',
      completedOn: '2026-01-28',
      source: 'file',
      estimate: { priceCents: 178_050, stages: { strip: 90 } },
      actual: { stages: { strip: 110 } },
      products: [{ product: 'CW1', ml: 4200 }],
      invoice: { totalCents: 87_005, issuedOn: '2026-01-29' },
    });
    const second = await job('W-2');
    expect(second['vehicle'].model).toBe('Ono; Größe');
    expect(second['estimate']).toBeUndefined();
    expect(second['invoice']).toBeUndefined();
  });

  it('given twice, changes nothing the second time', async () => {
    const content = `${HEADINGS}\nT-1;A;B;van;2010-01;full;2026-01-28;100,00;10;20;0;1000;5,00;2026-01-29\n`;
    await confirm(await send(content));
    const again = await send(content);
    expect(counts(again)).toEqual({ rows: 1, new: 0, changed: 0, unchanged: 1, refused: 0 });
    expect((await confirm(again)).body.written).toMatchObject({ unchanged: 1 });
    expect((await job('T-1'))['revision']).toBe(1);
  });

  it('given tabs and quotes with line ends in them, keeps the text and tells lines as the file has them', async () => {
    const headings =
      'jobRef\tmake\tmodel\tbodyType\tfirstRegistered\tpackage\tcompletedOn\tstrip\tnotes';
    const row = (ref: string, notes: string): string =>
      `${ref}\tA\tB\tvan\t2010-01\tfull\t2026-01-28\t10\t${notes}`;
    const text = [
      headings,
      row('Q-1', '"one\ntwo ""quoted"""'),
      row('Q-2', '5" pipe'),
      row('', 'x'),
    ];
    const sent = await send(`\uFEFF${text.join('\n')}`);
    expect(sent.body.options).toMatchObject({ delimiter: '\t', encoding: 'utf-8' });
    expect((sent.body.preview as PreviewRow[]).map(({ line, status }) => [line, status])).toEqual([
      [2, 'new'],
      [4, 'new'],
      [5, 'refused'],
    ]);
    await confirm(sent);
    expect((await job('Q-1'))['notes']).toBe('one\ntwo "quoted"');
    expect((await job('Q-2'))['notes']).toBe('5" pipe');
  });

  it('given few columns of a job that is there, leaves what it does not speak of', async () => {
    await app.call('put', '/api/branches/AAA/jobs/K-1', {
      token: network.manager,
      body: validJob(),
    });
    const sent = await send('Job,Completed on,Invoice total\nK-1,2026-01-27,900.00\n');
    expect(sent.body.missingFields).toContain('vehicle.make');
    expect(counts(sent)).toMatchObject({ changed: 1, refused: 0 });
    await confirm(sent);
    const after = await job('K-1');
    expect(after).toMatchObject({
      revision: 2,
      completedOn: '2026-01-27',
      invoice: { number: '0417', issuedOn: '2026-01-29', totalCents: 90_000 },
      checks: { linersOff: 'yes' },
    });
    expect(after['findings']).toHaveLength(1);
    const emptied = await send('Job,Notes,Invoice total,Invoice number,Invoice date\nK-1,,,,\n');
    await confirm(emptied);
    expect((await job('K-1'))['invoice']).toBeUndefined();
  });

  it('given findings by number, matches stored ones by place and keeps their reference and note', async () => {
    const finding = {
      ref: 'own',
      zone: 'floor',
      side: 'left',
      seenAs: 'bubbling',
      structural: true,
    };
    const body = validJob({ findings: [{ ...finding, action: 'deferred', note: 'kept' }] });
    await app.call('put', '/api/branches/AAA/jobs/F-1', { token: network.manager, body });
    const headings = ['zone', 'side', 'seen as', 'worked as', 'structural', 'action', 'charged'];
    const names = [1, 2].flatMap((place) => headings.map((name) => `finding ${place} ${name}`));
    const cells =
      'door bottom,right,surface,,no,declined,,Floor,left,bubbling,holed,yes,patched,90.00';
    const file = `job,${names.join(',')},repair minutes\nF-1,${cells},185\n`;
    const sent = await send(file);
    expect([sent.body.refusedPreview, counts(sent)]).toMatchObject([[], { changed: 1 }]);
    await confirm(sent);
    expect((await job('F-1'))['findings']).toEqual([
      expect.objectContaining({ ref: 'door_bottom/right/1', action: 'declined' }),
      expect.objectContaining({ ref: 'own', note: 'kept', workedAs: 'holed', chargedCents: 9000 }),
    ]);
    expect(counts(await send(file))).toMatchObject({ unchanged: 1 });
    const narrow = await send(`job,finding 1 zone,finding 1 side\nF-1,floor,left\n`);
    expect(narrow.body.refusedPreview[0].problems[0].message).toContain('has 2 findings');
  });

  it('given a voided job with equal content, leaves it void', async () => {
    const content =
      'job,make,model,body,registered,package,completed,strip\nV-1,A,B,van,2010-01,full,2026-01-28,10\n';
    await confirm(await send(content));
    await app.call('delete', '/api/branches/AAA/jobs/V-1', { token: network.manager });
    const again = await send(content);
    expect(counts(again)).toMatchObject({ unchanged: 1 });
    await confirm(again);
    expect((await job('V-1')).status).toBe(404);
  });

  it('given one reference several times, takes equal rows once and refuses rows that differ, each time alike', async () => {
    const row = (ref: string, minutes: number): string =>
      `${ref},A,B,van,2010-01,full,2026-01-28,${minutes}`;
    const content = [
      'job,make,model,body,registered,package,completed,strip',
      ...[row('R-1', 10), row('R-1', 10), row('R-2', 10), row('R-2', 20)],
    ].join('\n');
    const sent = await send(content);
    expect(counts(sent)).toEqual({ rows: 4, new: 1, changed: 0, unchanged: 1, refused: 2 });
    expect(sent.body.refusedPreview[0].problems).toEqual([
      { heading: 'job', message: 'stands in lines 4, 5 with different content; leave one of them' },
    ]);
    expect((await confirm(sent)).body.written).toEqual({
      created: 1,
      replaced: 0,
      unchanged: 1,
      refused: 2,
    });
    expect(counts(await send(content))).toEqual({
      rows: 4,
      new: 0,
      changed: 0,
      unchanged: 2,
      refused: 2,
    });
  });
});

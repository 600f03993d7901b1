import { tellEvent } from './tell-event';

const told = (action: string, detail: unknown) =>
  tellEvent({
    id: 1,
    at: '2026-02-02T06:30:00.000Z',
    actor: 'office@network.example',
    address: '127.0.0.1',
    action,
    subject: '/x',
    branch: null,
    detail: JSON.stringify(detail),
    hash: 'a',
    previousHash: 'b',
  });

describe('tellEvent', () => {
  it('given before and after, tells what differs and keeps the rest as it is', () => {
    const { changes, detail } = told('person.change', {
      before: { name: 'A', branches: ['AAA'], active: true },
      after: { name: 'A', branches: ['AAA', 'BBB'], active: false },
      reason: 'moved',
    });
    expect(changes).toEqual([
      { path: '/branches', before: ['AAA'], after: ['AAA', 'BBB'] },
      { path: '/active', before: true, after: false },
    ]);
    expect(detail).toEqual({ reason: 'moved' });
  });

  it('given nothing before, tells every field as new; given a text, tells it as the whole', () => {
    expect(
      told('region.set', { before: null, after: { name: 'Coast', climate: null } }).changes,
    ).toEqual([{ path: '/name', before: null, after: 'Coast' }]);
    expect(told('person.rename', { before: 'A', after: 'B' }).changes).toEqual([
      { path: '', before: 'A', after: 'B' },
    ]);
  });

  it('given a cost, tells it under the name and in the unit that set-up asks for', () => {
    const fee = { kind: 'fee', from: '2026-01-01', value: 60_000 };
    expect(told('cost.set', { change: fee, before: 50_000 }).changes).toEqual([
      { path: '/feeRate', before: 0.05, after: 0.06 },
    ]);
    const rate = { kind: 'hourlyCost', code: 'AAA', from: '2026-01-01', value: 0 };
    expect(told('cost.set', { change: rate, before: null }).changes).toEqual([
      { path: '/hourlyCostCents', before: null, after: 0 },
    ]);
  });

  it('given a norm, tells its products by their codes', () => {
    const line = (product: string, ml: number) => ({ product, ml });
    const change = {
      kind: 'norm',
      package: 'full',
      bodyType: 'van',
      lines: [line('UW1', 900), line('CW1', 4000)],
    };
    expect(
      told('norm.set', { change, before: [line('CW1', 4000), line('ZP1', 50)] }).changes,
    ).toEqual([
      { path: '/norms/UW1', before: null, after: 900 },
      { path: '/norms/ZP1', before: 50, after: null },
    ]);
    expect(told('norm.set', { change: { ...change, lines: [] }, before: null }).changes).toEqual(
      [],
    );
  });

  it('given a job, matches its lists as the job sheet does', () => {
    const job = {
      vehicle: { make: 'Vela', model: 'Ono', bodyType: 'van', firstRegistered: '2010-01' },
      package: 'full',
      completedOn: '2026-01-28',
      actual: { stages: {} },
    };
    const { changes, detail } = told('job.correct', {
      revision: 2,
      before: job,
      after: { ...job, products: [{ product: 'CW1', ml: 5 }], notes: '' },
    });
    expect(changes).toEqual([
      { path: '/products/CW1/product', before: null, after: 'CW1' },
      { path: '/products/CW1/ml', before: null, after: 5 },
    ]);
    expect(detail).toEqual({ revision: 2 });
  });

  it('given no before and after, keeps what the event tells', () => {
    expect(told('export.jobs', { query: { q: 'x' } })).toMatchObject({
      changes: [],
      detail: { query: { q: 'x' } },
    });
  });
});

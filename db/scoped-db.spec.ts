import { SmallStore } from '../test/support/small-store';
import { sql } from './database';
import { Scope } from './scope';
import { UnscopedRead } from './assert-scoped';
import type { ScopedDb } from './scoped-db';
import { SCOPED_TABLES } from './tables';

let small: SmallStore;
beforeAll(async () => {
  small = await SmallStore.make();
  await small.putJob('AAA', 'a-1');
  await small.putJob('BBB', 'b-1');
  await small.putJob('BBB', 'b-2');
});
afterAll(() => small.close());

const reader = (...codes: string[]): ScopedDb => small.store.scoped(small.scope(...codes));
const refs = (db: ScopedDb): string[] =>
  db
    .all<{ job_ref: string }>(db.table('jobs').select('job_ref').orderBy('job_ref'))
    .map((row) => row.job_ref);

describe('ScopedDb', () => {
  it('given a scope, reads its rows and no others', () => {
    expect(refs(reader('AAA'))).toEqual(['a-1']);
    expect(refs(reader('AAA', 'BBB'))).toEqual(['a-1', 'b-1', 'b-2']);
    expect(refs(reader('CCC'))).toEqual([]);
  });

  it('given an empty scope, reads nothing from any table', () => {
    const db = small.store.scoped(Scope.nothing);
    for (const table of SCOPED_TABLES) expect(db.all(db.table(table))).toEqual([]);
  });

  it('given a later "or", is not widened by it', () => {
    const db = reader('AAA');
    const rows = db.all(db.table('jobs').where('job_ref', 'a-1').orWhereRaw('1 = 1'));
    expect(rows).toHaveLength(1);
  });

  it('given rows to visit one at a time, narrows them the same', () => {
    const db = reader('BBB');
    const rows = db.iterate(db.table('jobs').select('job_ref').orderBy('job_ref'));
    expect([...rows]).toEqual([{ job_ref: 'b-1' }, { job_ref: 'b-2' }]);
  });

  it('given a join, narrows both sides', () => {
    const db = reader('AAA');
    const query = db
      .table('jobs', 'j')
      .join(db.derived('job_facts', 'f'), 'f.job_id', 'j.id')
      .select('j.job_ref');
    expect(db.all(query)).toEqual([{ job_ref: 'a-1' }]);
  });

  it('given a snapshot, sees nothing that is written meanwhile', async () => {
    const db = reader('CCC');
    const seen: number[] = [];
    db.snapshot(() => {
      seen.push(refs(db).length);
      small.store.writing.driver.transaction(() => small.write('CCC', 'c-1', {}))();
      seen.push(refs(db).length);
    });
    expect([...seen, refs(db).length]).toEqual([0, 0, 1]);
  });

  it('given a statement past the scope, refuses it before it runs', () => {
    const db = reader('AAA');
    expect(() => db.all(sql('jobs').select('*'))).toThrow(UnscopedRead);
    expect(() => db.first(sql('job_facts').where('branch_id', 1))).toThrow(UnscopedRead);
    expect(() => db.iterate(sql.raw('select * from claims'))).toThrow(UnscopedRead);
  });

  it('given what it makes itself of every table, lets it pass', () => {
    const db = reader('AAA');
    for (const table of SCOPED_TABLES) {
      const query = db
        .table(table, 'x')
        .join(db.derived('jobs'), 'jobs.branch_id', 'x.branch_id')
        .leftJoin('job_revisions as r', 'r.job_id', 'jobs.id');
      expect(() => db.all(query.select('r.revision'))).not.toThrow();
    }
  });

  it('given a filter written almost like its own, refuses it', () => {
    const db = reader('AAA');
    const { sql: own, bindings } = db.table('jobs').toSQL().toNative();
    const widened = own.replace(' in (select', ' not in (select');
    expect(() => db.all(sql.raw(own, bindings as never))).not.toThrow();
    expect(() => db.all(sql.raw(widened, bindings as never))).toThrow(UnscopedRead);
  });
});

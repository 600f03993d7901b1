import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { COME_BACK_STATUSES, type ComeBackStatus } from '#shared/domain/vocabulary';
import { BRANCH_READS } from '../../test/support/golden-branches';
import { SmallStore } from '../../test/support/small-store';
import { Connection } from '../database';
import { NetworkReference } from '../network-reference';
import { ScopedDb } from '../scoped-db';
import { SIGNAL_READS } from './golden-signals';
import type { JobFilters } from './job-filters';
import { countActions, findAction, isSignal, listActionRows } from './actions';
import { iterateClaimRows, listClaimRows, sumClaims, type ClaimFilters } from './claim-list';
import { listClaimRevisions } from './claims';
import { iterateLeft, listLeft } from './come-back';
import { listLeftOfJob, listMarks } from './come-back-of-job';
import { readCostsOfDay } from './costs-of-day';
import { findImport, listImports, readImportCatalogue, rememberedColumns } from './imports';
import { countJobs, iterateJobRows, listJobRows, type ListFilters } from './job-list';
import { listBilledWeeks, listMissingCosts, sumSpans } from './margin';
import { readMarginTarget } from './margin-target';
import { packageCodes, readByKey, readByStage } from './overrun';
import {
  countBookings,
  countBranchCells,
  countBranchWeeks,
  listBranchLives,
  sumBranchCells,
} from './product-need';
import {
  countCarCells,
  listUncostedProducts,
  readNormedCars,
  readProductLines,
  sumUncosted,
} from './products';
import { findLastTime } from './last-time';
import { readTargets } from './targets';
import { listUnderWay } from './under-way';
import { listPhotos } from './photos';
import { readUsualFigures } from './usual';
import { countRungs, readQuoteFigures, scopedSource, type QuotedCar } from './quote';
import { readClimates, readRotCars, readSpellings } from './rot';
import { readClaims, readWarrantyCars } from './warranty';
import { laterArrivals } from './later-arrivals';
import { listWeekNotes } from './week-notes';

/**
 * The text of the statements that read many jobs, as SQLite gets it, so that a change of it is seen in review. After one that
 * is meant: UPDATE_GOLDEN=1 npx jest --selectProjects server --testPathPatterns golden
 */
const FOLDER = join(__dirname, 'golden');

const PERIOD = { from: '2026-01-05', to: '2026-01-11' };
const FEW: JobFilters = { ...PERIOD, packageIds: [1], bodyTypes: ['van'] };
const MANY: JobFilters = { ...PERIOD, packageIds: [1, 2], bodyTypes: ['van', 'suv', 'estate'] };
const LISTED: ListFilters = {
  ...FEW,
  make: 'Vela',
  model: 'Ono',
  ageBandIndex: 1,
  unbilled: true,
  hasRot: true,
  hasEstimate: true,
  rotPlaces: 1,
  productId: 1,
  text: 'x',
};
const CLAIMED: ClaimFilters = {
  ...FEW,
  ...{ counted: true, waiting: false, decision: 'open', cause: 'damage', zone: 'floor' },
  ...{ ageBandIndex: 1, cohort: PERIOD, jobRef: '1', text: 'x' },
};
const LEFT_AT = {
  danger: 1,
  completedOn: '2026-01-05',
  branch: 'AAA',
  jobRef: '1',
  place: 3,
  ref: 'x',
};
const CAR: QuotedCar = {
  ...{ packageId: 1, modelKey: 'x', bodyType: 'van', ageBandIndex: 1 },
  ...{ after: '2023-01-05', upTo: '2026-01-05' },
};
const PLACE = { key: 1, completedOn: '2026-01-05', branch: 'AAA', jobRef: '1' };

/** What each golden file is the text of. */
const READS: Record<
  string,
  (db: ScopedDb, filters: JobFilters, network: NetworkReference) => unknown
> = {
  'count-actions': (db) => countActions(db, { states: ['agreed'] }, '2026-01-05'),
  ...BRANCH_READS,
  'count-bookings': (db, filters) => countBookings(db, PERIOD, filters),
  'count-branch-cells': countBranchCells,
  'count-branch-weeks': countBranchWeeks,
  'count-car-cells': countCarCells,
  'count-jobs-by-use': (db) => countJobs(db, { productId: 1, productUse: 'under' }),
  'count-rungs': (db) => countRungs(scopedSource(db), CAR),
  'count-jobs': (db) => countJobs(db, LISTED),
  'find-action': (db) => findAction(db, 1),
  'find-import': (db) => findImport(db, 'AAA', 'x'),
  'find-last-time': (db) => findLastTime(db, { packageId: 1, bodyType: 'van', upTo: '2026-01-05' }),
  'is-signal': (db) => isSignal(db, 1),
  'iterate-job-rows': (db) => [...iterateJobRows(db, {}, 'completed')],
  'iterate-left': (db, filters) => [...iterateLeft(db, filters, statusesOf(filters))],
  'later-arrivals': (db) =>
    laterArrivals(
      db,
      { asOf: '2026-01-31', received: { jobRevision: 1, claimRevision: 1, event: 1 } },
      200,
    ),
  'list-action-rows': (db) => listActionRows(db, { states: ['agreed'] }, null, 51),
  'list-action-rows-after-a-place': (db) =>
    listActionRows(db, { states: ['agreed'] }, { ended: 0, key: '2026-01-05', id: 1 }, 51),
  'list-billed-weeks': (db, filters) => listBilledWeeks(db, filters, 26),
  'list-branch-lives': listBranchLives,
  'iterate-claim-rows': (db, filters) => [...iterateClaimRows(db, filters, '2026-01-05', 'made')],
  'list-claim-photos': (db) => listPhotos(db, 1, { of: 'claim', ref: 'x' }),
  'list-claim-revisions': (db) => listClaimRevisions(db, 'AAA', 'x'),
  'list-claim-rows-by-completion': (db, filters) =>
    listClaimRows(db, filters, '2026-01-05', 'completed', undefined, 51),
  'list-claim-rows-by-cost': (db, filters) =>
    listClaimRows(db, filters, '2026-01-05', 'cost', undefined, 51),
  'list-claim-rows-by-day': (db, filters) =>
    listClaimRows(db, filters, '2026-01-05', 'made', undefined, 51),
  'list-claim-rows-after-a-place': (db) =>
    listClaimRows(db, CLAIMED, '2026-01-05', 'made', { ...PLACE, claimRef: '1' }, 51),
  'list-imports': (db) => listImports(db, 'AAA', 100),
  'list-job-rows-by-completion': (db, filters) =>
    listJobRows(db, filters, 'completed', undefined, 51),
  'list-job-rows-by-difference': (db, filters) =>
    listJobRows(db, filters, 'difference', undefined, 51),
  'list-job-rows-by-margin': (db, filters) => listJobRows(db, filters, 'margin', undefined, 51),
  'list-job-rows-by-overrun': (db, filters) => listJobRows(db, filters, 'overrun', undefined, 51),
  'list-job-rows-by-waiting': (db, filters) => listJobRows(db, filters, 'waiting', undefined, 51),
  'list-job-rows-after-a-place': (db) => listJobRows(db, LISTED, 'completed', PLACE, 51),
  'list-left-after-a-place': (db, filters) =>
    listLeft(db, filters, statusesOf(filters), LEFT_AT, 51),
  'list-left-of-job': (db) => listLeftOfJob(db, 1),
  'list-marks': (db) => listMarks(db, 1, 'x'),
  'list-missing-costs': listMissingCosts,
  'list-photos': (db) => listPhotos(db, 1, { of: 'job', ref: 'x' }),
  'list-uncosted-products': listUncostedProducts,
  'list-under-way': (db) => listUnderWay(db, 1),
  ...SIGNAL_READS,
  'list-week-notes': (db) => listWeekNotes(db, '2026-W01', '2026-W05'),
  'network-rot-bands': (_db, filters, network) => network.rotBands(filters).bands,
  'network-quote-counts': (_db, _filters, network) => network.nearestQuoteSet(CAR, ['age'], 30),
  'network-warranty-cells': (_db, filters, network) => network.warrantyCells(filters, '2026-02-02'),
  'package-codes': packageCodes,
  'read-by-branch': (db, filters) => readByKey(db, filters, 'branch'),
  'read-by-month': (db, filters) => readByKey(db, filters, 'month'),
  'read-by-stage': readByStage,
  'read-climates': (db) => readClimates(db, db.scope.echo().regions),
  'read-claims': (db) => readClaims(db, '2026-02-02'),
  'read-costs-of-day': (db) => readCostsOfDay(db, '2026-01-05'),
  'read-import-catalogue': readImportCatalogue,
  'read-margin-target': readMarginTarget,
  'read-normed-cars': readNormedCars,
  'read-product-lines': readProductLines,
  'read-quote-figures': (db) => readQuoteFigures(scopedSource(db), CAR, 'model_age'),
  'read-rot-cars': readRotCars,
  'read-spellings': (db) => readSpellings(db, [1]),
  'read-targets': readTargets,
  'read-usual-figures': (db) => readUsualFigures(scopedSource(db), 1, CAR, 'model_age', () => true),
  'read-warranty-cars': readWarrantyCars,
  'remembered-columns': (db) => rememberedColumns(db, 'AAA', 'jobs'),
  'sum-claims': (db) => sumClaims(db, CLAIMED, '2026-01-05'),
  'sum-branch-cells': sumBranchCells,
  'sum-uncosted': sumUncosted,
  'sum-spans': (db, { packageIds, bodyTypes }) =>
    sumSpans(db, [PERIOD, PERIOD], { packageIds, bodyTypes }),
};

/** Reads that are about the one branch of a scope, and nothing without it. */
const OF_ONE_BRANCH = ['network-quote-counts', 'read-margin-target'];

/** As many statuses as packages, so that their number is seen not to change the text. */
function statusesOf({ packageIds = [] }: JobFilters): ComeBackStatus[] {
  return COME_BACK_STATUSES.slice(0, packageIds.length);
}

let small: SmallStore;
beforeAll(async () => {
  small = await SmallStore.make();
});
afterAll(() => small.close());

/** The statements that a reading sends, apart by a blank line, broken before each clause to be readable in a diff. */
function textOf(name: string, filters: JobFilters, branches: string[]): string {
  const texts: string[] = [];
  const { driver } = small.store.writing;
  const listening = new Proxy(driver, {
    get: (target, key) => {
      if (key !== 'prepare') return Reflect.get(target, key) as unknown;
      return (text: string) => {
        texts.push(text);
        return target.prepare(text);
      };
    },
  });
  const connection = new Connection(listening);
  const scope = small.scope(...branches);
  READS[name]?.(new ScopedDb(connection, scope), filters, new NetworkReference(connection, scope));
  return texts.map((text) => `${broken(text)};\n`).join('\n');
}

/** One line a clause, what stands in brackets left in one. */
function broken(text: string): string {
  const clause = /^ (?:from|where|group by|having|order by|limit|inner join|cross join) /;
  const flat = text.replace(/\s+/g, ' ');
  let depth = 0;
  let lines = '';
  for (let at = 0; at < flat.length; at += 1) {
    if (flat[at] === '(') depth += 1;
    if (flat[at] === ')') depth -= 1;
    const begins = depth === 0 && clause.test(flat.slice(at, at + 20));
    lines += begins ? '\n' : (flat[at] ?? '');
  }
  return lines;
}

describe('golden SQL', () => {
  if (process.env['UPDATE_GOLDEN'] === '1') {
    it('is written anew', () => {
      rmSync(FOLDER, { recursive: true, force: true });
      mkdirSync(FOLDER);
      for (const name of Object.keys(READS)) {
        writeFileSync(join(FOLDER, `${name}.sql`), textOf(name, FEW, ['AAA']));
      }
    });
    return;
  }

  it.each(Object.keys(READS))('given %s, is the text that was reviewed', (name) => {
    const text = textOf(name, FEW, ['AAA']);
    expect(text).not.toBe('');
    expect(text).toBe(readFileSync(join(FOLDER, `${name}.sql`), 'utf8'));
  });

  it.each(Object.keys(READS).filter((name) => !OF_ONE_BRANCH.includes(name)))(
    'given %s in another scope with other codes asked for, is the same text',
    (name) => {
      const text = textOf(name, FEW, ['AAA']);
      for (const branches of [[], ['BBB'], ['CCC', 'AAA', 'BBB']]) {
        expect(textOf(name, MANY, branches)).toBe(text);
      }
    },
  );

  it('given the folder, holds no text that nothing sends', () => {
    expect(readdirSync(FOLDER).sort()).toEqual(
      Object.keys(READS)
        .map((name) => `${name}.sql`)
        .sort(),
    );
  });
});

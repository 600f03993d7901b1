/** A piece of code as it would stand in a file, and the rule that must refuse it (none: it must pass). */
export interface Snippet {
  what: string;
  file: string;
  text: string;
  rule?: string;
}

const use = (source: string): string =>
  `import { thing } from '${source}';\nexport const it = thing;\n`;
const app = 'projects/dashboard/src/app';

/** An import from a file, and whether the house allows it. */
const ARROWS: readonly [file: string, source: string, allowed: 'refused' | 'allowed'][] = [
  ['shared/stats/mean.ts', '#shared/domain/money', 'refused'],
  ['shared/stats/mean.ts', '../domain/money', 'refused'],
  ['shared/stats/mean.ts', 'zod', 'refused'],
  ['shared/stats/mean.ts', 'node:fs', 'refused'],
  ['shared/stats/mean.ts', './sum', 'allowed'],
  ['shared/domain/money.ts', '#shared/contracts/fields', 'refused'],
  ['shared/domain/money.ts', '../contracts/fields', 'refused'],
  ['shared/domain/money.ts', '#db/scope', 'refused'],
  ['shared/domain/money.ts', '#shared/stats/sum', 'allowed'],
  ['shared/contracts/jobs.ts', '#shared/stats/sum', 'refused'],
  ['shared/contracts/jobs.ts', '#db/scope', 'refused'],
  ['shared/contracts/jobs.ts', '../../server/config', 'refused'],
  ['shared/contracts/jobs.ts', 'express', 'refused'],
  ['shared/contracts/jobs.ts', 'zod', 'allowed'],
  ['shared/contracts/jobs.ts', '#shared/domain/money', 'allowed'],
  ['db/queries/margin-weeks.ts', '#server/config', 'refused'],
  ['db/queries/margin-weeks.ts', '../../seeds/network', 'refused'],
  ['db/queries/margin-weeks.ts', 'express', 'refused'],
  ['db/queries/margin-weeks.ts', '../scoped-db', 'allowed'],
  ['db/queries/margin-weeks.ts', '#shared/domain/money', 'allowed'],
  ['server/features/margin/read-margin.ts', 'express', 'refused'],
  ['server/features/margin/read-margin.ts', 'knex', 'refused'],
  ['server/features/margin/read-margin.ts', 'better-sqlite3', 'refused'],
  ['server/features/margin/read-margin.ts', '#server/features/overrun/read-overrun', 'refused'],
  ['server/features/margin/read-margin.ts', '../overrun/read-overrun', 'refused'],
  ['server/features/margin/read-margin.ts', '#db/database', 'refused'],
  ['server/features/margin/read-margin.ts', '#db/unscoped-db', 'refused'],
  ['server/features/margin/read-margin.ts', '../../http/mount', 'refused'],
  ['server/features/margin/read-margin.ts', '#seeds/network', 'refused'],
  ['server/features/margin/read-margin.ts', './margin-limits', 'allowed'],
  ['server/features/margin/read-margin.ts', '#server/features/margin/margin-limits', 'allowed'],
  ['server/features/margin/read-margin.ts', '#db/queries/margin-weeks', 'allowed'],
  ['server/features/margin/read-margin.ts', '#shared/stats/median', 'allowed'],
  ['server/features/margin/read-margin.ts', '#server/kit', 'refused'],
  ['server/features/margin/read-margin.ts', '#db/store', 'refused'],
  ['server/features/margin/margin.endpoints.ts', '../../kit', 'allowed'],
  ['server/features/margin/margin.endpoints.ts', '#server/http/mount', 'allowed'],
  ['server/features/margin/margin.endpoints.ts', 'express', 'refused'],
  ['server/features/margin/margin.endpoints.ts', '../overrun/overrun.endpoints', 'refused'],
  ['server/http/mount.ts', 'knex', 'refused'],
  ['server/http/mount.ts', '#db/unscoped-db', 'refused'],
  ['server/http/mount.ts', '../../projects/dashboard/src/main', 'refused'],
  ['server/http/mount.ts', 'express', 'allowed'],
  ['server/http/mount.ts', '#db/scope', 'allowed'],
  ['server/auth/scope-for.ts', '#db/unscoped-db', 'allowed'],
  ['server/auth/scope-for.ts', 'passport', 'allowed'],
  [`${app}/features/week/week-page.ts`, '../jobs/jobs-series', 'refused'],
  [`${app}/features/week/week-page.ts`, '../../../../../../db/scope', 'refused'],
  [`${app}/features/week/week-page.ts`, '#server/config', 'refused'],
  [`${app}/features/week/week-page.ts`, '#shared/contracts/index', 'refused'],
  [`${app}/features/week/week-page.ts`, '#shared/contracts', 'refused'],
  [`${app}/features/week/week-page.ts`, '#shared/contracts/margin', 'allowed'],
  [`${app}/features/week/week-page.ts`, '../../core/api/reading', 'allowed'],
  [`${app}/features/week/week-page.ts`, './week-series', 'allowed'],
  [`${app}/core/session/session.ts`, '../../features/week/week-page', 'refused'],
  [`${app}/core/session/session.ts`, '../../charts/text-width', 'refused'],
  [`${app}/ui/answer/answer.ts`, '../../features/week/week-page', 'refused'],
  [`${app}/charts/bridge/bridge-chart.ts`, '@angular/common/http', 'refused'],
  [`${app}/charts/bridge/bridge-chart.ts`, '../../core/session/session', 'refused'],
  [`${app}/charts/bridge/bridge-chart.ts`, 'd3-scale', 'allowed'],
  [`${app}/underside-map/underside-map.ts`, '../features/rot/rot-page', 'refused'],
  [`${app}/underside-map/underside-map.ts`, '../core/session/session', 'refused'],
  [`${app}/underside-map/underside-map.ts`, '@angular/router', 'refused'],
  [`${app}/underside-map/underside-map.ts`, '../ui/words', 'allowed'],
  [`${app}/underside-map/underside-map.ts`, '../charts/measured-width', 'allowed'],
  [`${app}/features/rot/rot-page.ts`, '../../underside-map/underside-map', 'allowed'],
  [`${app}/app.routes.ts`, './features/week/week.routes', 'allowed'],
  [`${app}/app.routes.ts`, '#seeds/network', 'refused'],
  ['seeds/network.ts', '#server/http/mount', 'refused'],
  ['seeds/network.ts', 'knex', 'refused'],
  ['seeds/network.ts', '#server/features/jobs/accept-batch', 'allowed'],
  ['seeds/network.ts', '#db/unscoped-db', 'allowed'],
  ['server/features/margin/read-margin.spec.ts', '../../../db/database', 'allowed'],
  ['test/api/margin.spec.ts', '#server/app', 'allowed'],
];

/** Ways to import that must be caught as the plain one is. */
const WAYS: readonly [what: string, text: string][] = [
  ['a re-export', `export { thing } from '#db/scope';\n`],
  ['a re-export of everything', `export * from '../../db/scope';\n`],
  ['a type-only import', `import type { Scope } from '#db/scope';\nexport type It = Scope;\n`],
  ['a type named in place', `export type It = import('#db/scope').Scope;\n`],
  ['an import at run time', `export const it = await import('#db/scope');\n`],
  ['a require', `export const it: unknown = require('#db/scope');\n`],
  ['an import with require', `import scope = require('#db/scope');\nexport const it = scope;\n`],
];

const CLOCKS: readonly string[] = [
  'Date.now()',
  'new Date()',
  'Math.random()',
  'performance.now()',
  'crypto.randomUUID()',
];

/** Everything that the spec hands to the linter. */
export const SNIPPETS: readonly Snippet[] = [
  ...ARROWS.map(([file, source, allowed]) => ({
    what: `${file} importing ${source}`,
    file,
    text: use(source),
    rule: allowed === 'refused' ? 'underseam/arrows' : undefined,
  })),
  ...WAYS.map(([what, text]) => ({
    what: `${what} from db in shared/domain`,
    file: 'shared/domain/money.ts',
    text,
    rule: 'underseam/arrows',
  })),
  ...['shared/domain/a.ts', 'db/queries/a.ts', 'server/features/margin/a.ts'].flatMap((file) =>
    CLOCKS.map((clock) => ({
      what: `${clock} in ${file}`,
      file,
      text: `export const it = (): unknown => ${clock};\n`,
      rule: 'no-restricted-syntax',
    })),
  ),
  {
    what: 'the type of the store in a use case',
    file: 'server/features/margin/a.ts',
    text: `import type { Store } from '#db/store';\nexport type It = Store;\n`,
  },
  ...['margin', 'set-up'].map((feature) => ({
    what: `store.unscoped in server/features/${feature}`,
    file: `server/features/${feature}/a.ts`,
    text: 'export const it = (store: { unscoped: unknown }): unknown => store.unscoped;\n',
    rule: feature === 'margin' ? 'no-restricted-syntax' : undefined,
  })),
  {
    what: 'store.unscoped in a write of a feature about branches',
    file: 'server/features/bookings/a.ts',
    text: 'interface Store {\n  unscoped: unknown;\n  write(work: () => unknown): unknown;\n}\nexport const it = (store: Store): unknown => store.write(() => store.unscoped);\n',
  },
  {
    what: 'a date made from an argument in shared/domain',
    file: 'shared/domain/a.ts',
    text: 'export const it = (day: string): Date => new Date(day);\n',
  },
  {
    what: 'the clock in server/http',
    file: 'server/http/a.ts',
    text: 'export const it = (): number => Date.now();\n',
  },
  {
    what: 'an enum',
    file: 'server/http/a.ts',
    text: 'export enum Side {\n  Left,\n}\n',
    rule: 'no-restricted-syntax',
  },
  {
    what: 'any',
    file: 'server/http/a.ts',
    text: 'export const it = (value: any): unknown => value;\n',
    rule: '@typescript-eslint/no-explicit-any',
  },
  {
    what: 'a class called a service',
    file: 'server/http/a.ts',
    text: 'export class JobService {\n  jobs = 1;\n}\n',
    rule: 'no-restricted-syntax',
  },
  {
    what: 'a file of 301 lines',
    file: 'server/http/a.ts',
    text: `${'// line\n'.repeat(300)}export const it = 1;\n`,
    rule: 'max-lines',
  },
  {
    what: 'a file called utils',
    file: 'server/http/utils.ts',
    text: 'export const it = 1;\n',
    rule: 'underseam/file-names',
  },
  {
    what: 'a page that subscribes',
    file: `${app}/features/week/week-page.ts`,
    text: 'export const it = (stream: { subscribe(): void }): void => stream.subscribe();\n',
    rule: 'no-restricted-syntax',
  },
  {
    what: 'a picture without words for a screen reader',
    file: `${app}/features/week/week-page.html`,
    text: '<img src="mark.svg" />\n',
    rule: '@angular-eslint/template/alt-text',
  },
  {
    what: 'a style in the page itself',
    file: `${app}/features/week/week-page.html`,
    text: '<p style="color: red">words</p>\n',
    rule: '@angular-eslint/template/no-inline-styles',
  },
];

/** What a use case is handed, beside queries: the narrowed readers and writers. */
const HANDED = [
  'db/queries',
  'db/scope',
  'db/scoped-db',
  'db/accept-claim',
  'db/action-writer',
  'db/accept-job',
  'db/branch-writer',
  'db/breaks-against-job',
  'db/breaks-of-claims',
  'db/claim-writer',
  'db/come-back-writer',
  'db/photo-writer',
  'db/signal-writer',
  'db/target-writer',
  'db/under-way-writer',
  'db/import-writer',
  'db/network-reference',
];

/**
 * The layers of the house and what each may import: a folder, the folders it reaches, the packages it may not (or may only)
 * use, and the sentence a breach is answered with. The first match counts, so the narrower folder stands first. `*` is one
 * folder name, `files` narrows a layer to some of a folder's files; a file always reaches what lies in its own layer's
 * folder. `types` may be named as types only: handed, never made.
 */
export const layers = [
  {
    folder: 'shared/stats',
    reaches: [],
    onlyPackages: [],
    because:
      'shared/stats holds pure methods and imports nothing of ours: pass what it needs as an argument.',
  },
  {
    folder: 'shared/domain',
    reaches: ['shared/stats'],
    onlyPackages: [],
    because:
      'shared/domain computes from its arguments and imports only shared/stats: move what it needs down, or the caller up.',
  },
  {
    folder: 'shared/contracts',
    reaches: ['shared/domain'],
    onlyPackages: ['zod'],
    because:
      'shared/contracts describe calls for browser and server alike and import only shared/domain and zod.',
  },
  {
    folder: 'db',
    reaches: ['shared'],
    notPackages: ['express', 'passport', 'passport-jwt', 'jsonwebtoken'],
    because: 'db knows rows and scopes, not requests: it imports only shared.',
  },
  {
    // Where a contract is tied to its use case: the one file of a feature that knows the server around it.
    folder: 'server/features/*',
    files: /\.endpoints\.ts$/,
    reaches: [
      'shared',
      ...HANDED,
      'server/http',
      'server/kit',
      'server/clock',
      'server/auth',
      'server/storage',
    ],
    types: ['db/store', 'db/network-state'],
    notPackages: ['express', 'passport', 'passport-jwt', 'jsonwebtoken', 'knex', 'better-sqlite3'],
    because:
      'an endpoints file ties contracts to the use cases of its own feature through server/http and the kit, and never reaches express, knex or another feature.',
  },
  {
    folder: 'server/features/*',
    reaches: ['shared', ...HANDED],
    types: ['db/store', 'db/network-state'],
    notPackages: ['express', 'passport', 'passport-jwt', 'jsonwebtoken', 'knex', 'better-sqlite3'],
    because:
      'a use case tells its story with shared and db/queries, and never reaches express, knex, the rest of the server or another feature: hand it what it needs, or move the common part to shared or db/queries.',
  },
  {
    folder: 'server',
    reaches: ['shared', 'db', 'seeds'],
    notPackages: ['knex', 'better-sqlite3'],
    because:
      'the server imports shared, db and (to fill an empty data folder) seeds; knex and better-sqlite3 stay private to db.',
  },
  {
    folder: 'projects/dashboard/src/app/features/*',
    reaches: [
      'shared',
      'projects/dashboard/src/app/core',
      'projects/dashboard/src/app/charts',
      'projects/dashboard/src/app/ui',
      'projects/dashboard/src/app/underside-map',
      'projects/dashboard/src/theme',
    ],
    because:
      'a page imports core, charts, ui, underside-map and shared, and never another page: move what two pages use into ui.',
  },
  {
    folder: 'projects/dashboard/src/app/core',
    reaches: ['shared', 'projects/dashboard/src/app/ui', 'projects/dashboard/src/theme'],
    because: 'core is below every page: it imports no feature and draws no chart.',
  },
  {
    folder: 'projects/dashboard/src/app/ui',
    reaches: ['shared', 'projects/dashboard/src/app/core', 'projects/dashboard/src/theme'],
    because: 'ui holds pieces that any page may use: it imports no feature.',
  },
  {
    folder: 'projects/dashboard/src/app/charts',
    reaches: ['shared', 'projects/dashboard/src/theme', 'projects/dashboard/src/app/ui'],
    notPackages: ['@angular/common/http', '@angular/router'],
    because:
      'a chart takes data in and gives a picture out: no HTTP, no session, no router, no feature.',
  },
  {
    folder: 'projects/dashboard/src/app/underside-map',
    reaches: [
      'shared',
      'projects/dashboard/src/app/ui',
      'projects/dashboard/src/app/charts',
      'projects/dashboard/src/theme',
    ],
    notPackages: ['@angular/common/http', '@angular/router'],
    because:
      'the underside map takes data in and gives a picture out: no HTTP, no session, no router, no feature.',
  },
  {
    folder: 'projects',
    reaches: ['shared'],
    because: 'the dashboard knows the server only by shared.',
  },
  {
    folder: 'seeds',
    reaches: ['shared', 'db', 'server/features', 'server/auth'],
    notPackages: ['express', 'passport', 'passport-jwt', 'knex', 'better-sqlite3'],
    because:
      'seeds go through the front door: they import shared, db, server/features and server/auth.',
  },
];

/**
 * Modules that only the named folders or files may import, whatever their layer reaches. Edit the list when a further place
 * has its reason.
 */
export const guarded = [
  {
    module: 'db/unscoped-db',
    importers: [
      'db',
      'server/auth',
      'server/commands',
      'server/features/set-up',
      'server/main',
      'seeds',
    ],
    because:
      'db/unscoped-db sees every branch: read through the ScopedDb you were handed, or add this place to test/lint/rules/layers.mjs with its reason.',
  },
  {
    module: 'shared/contracts/index',
    importers: ['server', 'seeds', 'shared/contracts'],
    because:
      'the index of all contracts would pull every schema into the browser: import the one contract you call.',
  },
];

/** Features about the whole network, whose use cases may take `store.unscoped` out of the store they were handed. */
export const networkFeatures = [
  'set-up',
  'set-up-help',
  'people',
  'push-keys',
  'sign-in',
  'network',
  'mailbox',
  'digests',
  'audit',
  'warranty-reports',
];

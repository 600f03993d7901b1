/** Builds the pages, then the service worker that knows all their files, and lets the page name it. */
import { readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { build } from 'esbuild';
import { root } from './fingerprint.mjs';
import { precacheList } from './precache-list.mjs';
import { runHere } from './run-process.mjs';

const folder = path.join(root, 'dist/dashboard');
const ended = await runHere(process.execPath, ['node_modules/@angular/cli/bin/ng.js', 'build']);
if (ended.code !== 0) process.exit(ended.code);

// Only a page that was built with its worker asks for it: what `ng serve` shows is never kept.
const page = path.join(folder, 'index.html');
writeFileSync(
  page,
  readFileSync(page, 'utf8').replace(
    '</head>',
    '<meta name="service-worker" content="/service-worker.js"></head>',
  ),
);
const kept = precacheList(folder);
await build({
  absWorkingDir: root,
  entryPoints: ['projects/dashboard/worker/service-worker.ts'],
  outfile: path.join(folder, 'service-worker.js'),
  bundle: true,
  minify: true,
  format: 'iife',
  target: 'es2022',
  define: { PRECACHE: JSON.stringify(kept), 'process.env.NODE_ENV': '"production"' },
  tsconfig: 'projects/dashboard/tsconfig.worker.json',
  logLevel: 'warning',
});
console.log(`The service worker keeps ${kept.length} files.`);

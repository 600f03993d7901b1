import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { askModule } from '../support/ask-module';
import { benchBranches } from './branches';
import { benchImports } from './imports';
import { benchIngest } from './ingest';
import { benchPage } from './page';
import { benchReads } from './reads';
import { print, type Line } from './report';
import { benchUnderneath } from './underneath';

const FIND_CHROMIUM = join(__dirname, '..', 'support', 'find-chromium.mjs');

/** `npm run bench [ingest] [imports] [reads] [underneath] [branches] [page]`: compares ours with a yardstick in one run; without names, everything. */
async function main(): Promise<void> {
  const asked = process.argv.slice(2);
  const jobs = Number(process.env['BENCH_JOBS'] ?? 100_000);
  const sizes = (process.env['BENCH_SIZES'] ?? '100000,1000000').split(',').map(Number);
  const today = '2026-02-02';
  const folder = mkdtempSync(join(tmpdir(), 'underseam-bench-'));
  const benches: Record<string, () => Promise<Line[]>> = {
    ingest: () => benchIngest(folder, 5_000, today),
    imports: () => benchImports(folder, Number(process.env['BENCH_ROWS'] ?? 200_000), today),
    reads: () => benchReads(folder, jobs, today),
    underneath: () => benchUnderneath(folder, sizes, today),
    branches: () => benchBranches(folder, sizes, today),
    page: async () => {
      const browser = askModule(FIND_CHROMIUM, 'findChromium', []);
      if (typeof browser !== 'string') throw new Error('the page bench needs Chromium; set CHROME');
      return benchPage(folder, browser);
    },
  };
  try {
    for (const [name, bench] of Object.entries(benches)) {
      if (asked.length === 0 || asked.includes(name)) print(await bench());
    }
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

main().catch((error: unknown) => {
  process.stderr.write(
    `${error instanceof Error ? (error.stack ?? error.message) : String(error)}\n`,
  );
  process.exit(1);
});

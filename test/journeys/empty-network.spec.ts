import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { Page } from 'playwright-core';
import { serve, type Served } from '../bench/serve';
import { root } from '../support/project-files';
import { auditPage, untilStill } from './audit-page';
import { useChromium } from './chromium';
import { MONDAY_MORNING } from './served-demo';
import { typeSignIn, untilReady } from './sign-in';

const FIRST = { email: 'first@network.example', password: 'nobody-was-here-before' };

/** A network on its first day: no branch, no car, one person of head office. Every page opens and says what to do next. */
describe('an empty network', () => {
  let folder: string;
  let served: Served;
  const openWindow = useChromium(() => served.url);
  let page: Page;

  beforeAll(async () => {
    folder = mkdtempSync(path.join(tmpdir(), 'underseam-empty-'));
    served = await serve(folder, { UNDERSEAM_DEMO: 'off', UNDERSEAM_NOW: MONDAY_MORNING });
    addFirstPerson(folder);
    page = (await openWindow()).page;
    await page.goto('/sign-in');
    await typeSignIn(page, FIRST);
    await page.waitForURL('**/this-week');
    await untilReady(page);
  });

  afterAll(async () => {
    await served?.stop();
    rmSync(folder, { recursive: true, force: true });
  });

  test.each([
    ['/this-week', 'No car was finished in week 5, 2026.', 'Choose another week'],
    ['/overruns', 'No car with an estimate was finished in this time.', 'Choose a longer time'],
    ['/jobs', '0 cars finished', 'No car fits this. Widen the dates'],
    ['/mailbox', 'Mailbox', 'No mail yet. Inviting a person'],
  ])('%s, with nothing to show, says so and what to do', async (address, says, todo) => {
    await page.goto(address);
    await untilReady(page);
    expect(await page.getByRole('heading', { level: 1 }).innerText()).toContain(says);
    expect(await page.getByRole('main').innerText()).toContain(todo);
    await untilStill(page);
    expect(await auditPage(page)).toEqual([]);
  });
});

/** As the README says it is done, beside the running server. */
function addFirstPerson(data: string): void {
  const ended = spawnSync(
    process.execPath,
    [
      path.join(root, 'server/commands/run.mjs'),
      'person-add',
      ...['--email', FIRST.email, '--name', 'Tove Grindskar', '--role', 'head_office'],
    ],
    {
      encoding: 'utf8',
      env: { ...process.env, UNDERSEAM_DATA: data, UNDERSEAM_PASSWORD: FIRST.password },
    },
  );
  if (ended.status !== 0) throw new Error(ended.stderr);
}

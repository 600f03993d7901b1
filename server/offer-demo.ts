import { hasPerson, isEmptyNetwork } from '#db/queries/empty-network';
import { DEMO_PEOPLE, DEMO_PUSH_KEY } from '#seeds/demo-people';
import { loadNetwork } from '#seeds/load-network';
import { localDate } from '#shared/domain/calendar';
import type { Kit } from './kit';

/** Seeds an empty data folder with the demo network (unless switched off) and says who can sign in. */
export async function offerDemo({ store, passwords, clock, config }: Kit): Promise<string> {
  if (!config.demo) {
    return isEmptyNetwork(store.unscoped)
      ? 'The network is empty. Make its first person with "npm run person:add".'
      : '';
  }
  if (isEmptyNetwork(store.unscoped)) {
    const begun = Date.now();
    process.stdout.write('Making the demo network (about half a minute) …\n');
    const jobs = await loadNetwork(store, passwords, localDate(clock.now(), 'UTC'));
    store.tidy();
    const seconds = ((Date.now() - begun) / 1000).toFixed(1);
    process.stdout.write(`${jobs} jobs in ${seconds} s.\n`);
  }
  if (!DEMO_PEOPLE.every(({ email }) => hasPerson(store.unscoped, email))) return '';
  return [
    'Demo sign-ins (invented people; never keep real work in this data folder):',
    ...DEMO_PEOPLE.map(
      ({ role, email, password }) =>
        `  ${role.replace('_', ' ').padEnd(14)} ${email.padEnd(32)} ${password}`,
    ),
    `  push key of ${DEMO_PUSH_KEY.branch}: ${DEMO_PUSH_KEY.key}`,
    '',
  ].join('\n');
}

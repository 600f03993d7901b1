import { parseArgs } from 'node:util';
import { Store } from '#db/store';
import { addPerson as contract } from '#shared/contracts/people';
import { problemsOf } from '#shared/contracts/read-problems';
import { refuseInput } from '#shared/domain/refusal';
import { randomSecret } from '../auth/random-secret';
import { readConfig } from '../config';
import { addPerson } from '../features/people/add-person';
import { PasswordThread } from '../workers/password-thread';
import { CommandRefused, runCommand } from './command';

/**
 * `UNDERSEAM_PASSWORD=… npm run person:add -- --email E --name N --role R [--branch C]… [--region C]…`: adds a person who signs
 * in with that password. The way to the first person of an empty network; the server may be running.
 */
async function personAdd(): Promise<void> {
  const person = readPerson();
  const store = await Store.open(readConfig(process.env).data);
  const passwords = new PasswordThread();
  try {
    const added = await addPerson(
      { store, passwords, newToken: randomSecret, outbox: NO_MAIL },
      person,
      {
        actor: { label: 'system', personId: null, pushKeyId: null, address: 'local' },
        now: new Date(),
      },
    );
    console.log(`Added ${added.name} (${added.email}) as ${added.role.replace('_', ' ')}.`);
  } finally {
    await passwords.close();
    store.close();
  }
}

/** Whoever is given a password is not invited by mail. */
const NO_MAIL = {
  queueInvitation(): never {
    throw new Error('a person added here has a password');
  },
};

function readPerson() {
  const { values } = parseArgs({
    options: {
      email: { type: 'string' },
      name: { type: 'string' },
      role: { type: 'string' },
      branch: { type: 'string', multiple: true },
      region: { type: 'string', multiple: true },
    },
    strict: true,
  });
  const password = process.env['UNDERSEAM_PASSWORD'];
  if (password === undefined || password === '') {
    throw new CommandRefused(
      'Set UNDERSEAM_PASSWORD to the password of the person; on the command line others could read it.',
    );
  }
  const { email, name, role, branch, region } = values;
  const person = { email, name, role, branches: branch, regions: region, password };
  const parsed = contract.body.safeParse(person);
  if (!parsed.success) throw refuseInput(problemsOf(parsed.error));
  return parsed.data;
}

void runCommand(personAdd);

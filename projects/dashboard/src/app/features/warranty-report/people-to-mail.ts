import type { OutOf } from '#shared/contracts/endpoint';
import type { listPeople } from '#shared/contracts/people';

type Person = OutOf<typeof listPeople>['items'][number];

/** Somebody who can be chosen, with why a choice of before no longer holds. */
export interface Recipient {
  readonly id: number;
  readonly name: string;
  readonly email: string;
  readonly trouble: string | undefined;
}

/** People of head office who can sign in, and those chosen before who no longer can be: they are shown until taken out. */
export function peopleToMail(people: readonly Person[], chosen: readonly number[]): Recipient[] {
  return people
    .map((person) => ({ person, trouble: troubleOf(person) }))
    .filter(({ person, trouble }) => trouble === undefined || chosen.includes(person.id))
    .map(({ person: { id, name, email }, trouble }) => ({ id, name, email, trouble }));
}

function troubleOf({ role, active }: Person): string | undefined {
  if (role !== 'head_office') return 'no longer of head office: take the tick out';
  return active ? undefined : 'turned off: take the tick out';
}

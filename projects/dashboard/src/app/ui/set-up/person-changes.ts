import type { OutOf } from '#shared/contracts/endpoint';
import * as contract from '#shared/contracts/people';
import { type Role, ROLES } from '#shared/domain/vocabulary';
import type { Api } from '../../core/api/api';
import { ROLE_NAMES } from '../words';
import type { ChangeOf } from './change-of';
import { rowChoices } from './choices';
import { type Field, textOf, type Typed } from './field';
import { codesOf } from './read-field';

/** Somebody with a sign-in. */
export type Person = OutOf<typeof contract.changePerson>;

type Row = { readonly code: string; readonly name: string };
/** Where people can be placed. */
export interface Places {
  readonly regions: readonly Row[];
  readonly branches: readonly Row[];
}

/** Invites a person, or adds them with a password. */
export function addPersonChange(
  api: Api,
  places: Places,
): ChangeOf<OutOf<typeof contract.addPerson>> {
  return {
    label: 'A new person',
    act: 'Add the person',
    after: 'clear',
    fields: [
      { key: 'name', label: 'Name', kind: 'text' },
      { key: 'email', label: 'E-mail', kind: 'email', hint: 'They sign in with it.' },
      ...placedFields(places),
      {
        key: 'way',
        label: 'How they get in',
        kind: 'choice',
        choices: [
          { value: 'mail', name: 'by an invitation mailed to them' },
          { value: 'password', name: 'with a password set here' },
        ],
      },
      {
        key: 'password',
        label: 'First password',
        kind: 'newPassword',
        autocomplete: 'new-password',
        hint: 'At least 12 characters. Hand it over yourself; they can change it.',
        shownIf: (typed) => textOf(typed, 'way') === 'password',
      },
    ],
    start: { way: 'mail', role: 'recorder', branches: only(places.branches) },
    save: (typed) =>
      api.call(contract.addPerson, {
        body: {
          email: textOf(typed, 'email'),
          name: textOf(typed, 'name'),
          ...placed(typed),
          ...(textOf(typed, 'way') === 'password' ? { password: typed['password'] ?? '' } : {}),
        },
      }),
  };
}

/** Name, role and scope of a person. */
export function personChange(api: Api, places: Places, person: Person): ChangeOf<Person> {
  return {
    label: `Person ${person.name}`,
    act: 'Save the changes',
    fields: [{ key: 'name', label: 'Name', kind: 'text' }, ...placedFields(places)],
    start: {
      name: person.name,
      role: person.role,
      regions: person.regions.join(' '),
      branches: person.branches.join(' '),
    },
    save: (typed) =>
      api.call(contract.changePerson, {
        params: { id: person.id },
        body: { name: textOf(typed, 'name'), ...placed(typed), active: person.active },
      }),
  };
}

/** Turns a person's sign-in off, or on again. */
export function activity(api: Api, person: Person, active: boolean) {
  const { name, role, regions, branches } = person;
  return api.call(contract.changePerson, {
    params: { id: person.id },
    body: { name, role, regions, branches, active },
  });
}

function placedFields({ regions, branches }: Places): readonly Field[] {
  return [
    {
      key: 'role',
      label: 'Role',
      kind: 'choice',
      choices: ROLES.map((role) => ({ value: role, name: ROLE_NAMES[role] })),
    },
    {
      key: 'branches',
      label: 'Branches they see',
      kind: 'several',
      choices: rowChoices(branches),
      shownIf: (typed) => ['recorder', 'site_manager'].includes(textOf(typed, 'role')),
    },
    {
      key: 'regions',
      label: 'Regions they see',
      kind: 'several',
      choices: rowChoices(regions),
      shownIf: (typed) => textOf(typed, 'role') === 'regional_lead',
    },
  ];
}

/** What the role takes of what was ticked (rule 65). */
function placed(typed: Typed): { role: Role; regions: string[]; branches: string[] } {
  const role = textOf(typed, 'role') as Role;
  return {
    role,
    regions: role === 'regional_lead' ? codesOf(typed, 'regions') : [],
    branches: role === 'recorder' || role === 'site_manager' ? codesOf(typed, 'branches') : [],
  };
}

function only(rows: readonly Row[]): string {
  return rows.length === 1 ? (rows[0]?.code ?? '') : '';
}

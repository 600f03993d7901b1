import { findPerson } from '#db/queries/people';
import type { Store } from '#db/store';
import type { FieldProblem } from '#shared/contracts/fields';

/** What is wrong with the people chosen, each at its place: the report is for active people of head office. */
export function checkPeople({ unscoped }: Store, people: readonly number[]): FieldProblem[] {
  return people.flatMap((id, index): FieldProblem[] => {
    const path = `/people/${index}`;
    if (people.indexOf(id) !== index) return [{ path, message: 'is named twice' }];
    const person = id > 0 ? findPerson(unscoped, id) : undefined;
    if (!person) return [{ path, message: 'nobody has this id' }];
    if (person.role !== 'head_office') return [{ path, message: 'is not of head office' }];
    return person.active ? [] : [{ path, message: 'is turned off' }];
  });
}

import { differences, flatFields, type Difference } from './flat-fields';

/** Fields that a recorder does not see (rule 24). */
const MONEY = ['/costCents'];

/** What differs between two versions of a claim, field by field; a default and its absence are the same (rule 25). */
export function claimChanges(
  before: object,
  after: object,
  money: 'seen' | 'unseen',
): Difference[] {
  const changes = differences(flatFields(before), flatFields(after));
  return money === 'seen' ? changes : changes.filter(({ path }) => !MONEY.includes(path));
}

import { formatList } from '../../ui/format';
import type { Person } from '../../ui/set-up/person-changes';

/** Names of places by their codes. */
export interface PlaceNames {
  regionName(code: string): string;
  branchName(code: string): string;
}

/** What a person sees, in words: "Havnsund", "all of Hill country and Coast", "the whole network". */
export function placesWords(
  { role, regions, branches }: Pick<Person, 'role' | 'regions' | 'branches'>,
  names: PlaceNames,
): string {
  if (role === 'head_office') return 'the whole network';
  if (role === 'regional_lead') {
    return `all of ${formatList(regions.map((code) => names.regionName(code)))}`;
  }
  return formatList(branches.map((code) => names.branchName(code)));
}

/** Whether somebody can sign in, in a word or two. */
export function standingWords({ active, invited }: Pick<Person, 'active' | 'invited'>): string {
  if (!active) return 'turned off';
  return invited ? 'invited, not here yet' : 'active';
}

import { signedInPerson, type SignedInPerson } from '#shared/contracts/auth';

const KEY = 'underseam.person';

/**
 * The last person signed in on this device, without any token: enough to open the shell and their drafts when there is no
 * line. Goes when they sign out.
 */
export function keptPerson(): SignedInPerson | undefined {
  try {
    const read = signedInPerson.safeParse(JSON.parse(localStorage.getItem(KEY) ?? 'null'));
    return read.success ? read.data : undefined;
  } catch {
    return undefined;
  }
}

export function keepPerson(person: SignedInPerson | undefined): void {
  try {
    if (person) localStorage.setItem(KEY, JSON.stringify(person));
    else localStorage.removeItem(KEY);
  } catch {
    // Storage is switched off: then the product opens with a line only.
  }
}

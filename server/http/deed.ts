import type { Deed } from '#db/queries/audit';
import type { Put } from '#db/queries/set-up';
import { actorOf } from '../auth/caller';
import { realClock } from '../clock';
import type { Call } from './mount';

/** Who calls, when, and what: as the audit trail names it. */
export function deedOf(call: Call, subject: string): Deed {
  return { actor: actorOf(call.caller, call.address), at: realClock.now().toISOString(), subject };
}

/** 201 for a row that was not there, 200 after (rule 66). */
export function statusOf(put: Put): number {
  return put === 'created' ? 201 : 200;
}

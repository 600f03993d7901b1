import type { Put } from '#db/queries/set-up';
import { actorOf } from '../../auth/caller';
import { realClock } from '../../clock';
import type { Call } from '../../http/mount';
import type { Changing } from './change-costs';

/** Who calls, for the trail. */
export function changing(call: Call, subject: string): Changing {
  return {
    actor: actorOf(call.caller, call.address),
    at: realClock.now().toISOString(),
    subject,
  };
}

/** 201 for a row that was not there, 200 after (rule 66). */
export function statusOf(put: Put): number {
  return put === 'created' ? 201 : 200;
}

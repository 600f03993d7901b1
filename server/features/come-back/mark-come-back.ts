import type { ComeBackWriter, Mark, Marking } from '#db/come-back-writer';
import { tellComeBack, type ComeBackRow } from '#db/queries/come-back-row';
import type { ComeBack, ComeBackMark } from '#shared/contracts/come-back';
import { notFound, Refusal } from '#shared/domain/refusal';
import type { Role } from '#shared/domain/vocabulary';

const UNMARKED: Mark = { status: 'open', dueOn: null, note: '', ownerToldOn: null };

/**
 * Sets a mark on a finding left on a car: what is left out stays, null takes away, and the same again writes nothing. Runs
 * inside a write, so that the mark it is compared with cannot change meanwhile.
 */
export function markComeBack(
  writer: ComeBackWriter,
  jobRef: string,
  ref: string,
  sent: ComeBackMark,
  marking: Marking & { role: Role },
): ComeBack {
  const found = writer.find(jobRef, ref);
  if (!found) throw notFound();
  if (marking.role === 'recorder') checkRecorder(found, sent);
  const before = markOf(found);
  const after = marked(found, before ?? UNMARKED, sent);
  if (same(after, before ?? UNMARKED)) return tellComeBack(found);
  writer.mark(found, after, before, marking);
  const now = writer.find(jobRef, ref);
  if (!now) throw notFound();
  return tellComeBack(now);
}

/** A recorder says that an owner was called or has booked; that a case is closed, or open again, the manager decides (rule 78). */
function checkRecorder(found: ComeBackRow, sent: ComeBackMark): void {
  if (sent.status !== 'contacted' && sent.status !== 'booked') {
    throw new Refusal('forbidden', 'A recorder marks a finding as contacted or booked only.');
  }
  if (found.status === 'done' || found.status === 'gone') {
    throw new Refusal('forbidden', 'This finding is closed; the site manager changes it.');
  }
}

function markOf(found: ComeBackRow): Mark | null {
  if (found.mark_status === null) return null;
  return {
    status: found.mark_status,
    dueOn: found.due_on,
    note: found.note ?? '',
    ownerToldOn: found.owner_told_on,
  };
}

function marked(found: ComeBackRow, before: Mark, sent: ComeBackMark): Mark {
  // Done is what it stands at already: said again, it must not outlive the job that closed it (rule 72).
  const repeatsClosing = found.closed_by !== null && sent.status === 'done';
  const reopens = before.status !== 'gone';
  return {
    status: repeatsClosing && reopens ? before.status : sent.status,
    dueOn: sent.dueOn === undefined ? before.dueOn : sent.dueOn,
    note: sent.note === undefined ? before.note : (sent.note ?? '').normalize('NFC').trim(),
    ownerToldOn: sent.ownerToldOn === undefined ? before.ownerToldOn : sent.ownerToldOn,
  };
}

function same(a: Mark, b: Mark): boolean {
  return (
    a.status === b.status &&
    a.dueOn === b.dueOn &&
    a.note === b.note &&
    a.ownerToldOn === b.ownerToldOn
  );
}

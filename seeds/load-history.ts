import { BranchWriter, type Receipt } from '#db/branch-writer';
import { ClaimWriter } from '#db/claim-writer';
import { recordAudit } from '#db/queries/audit';
import { putBookingRow } from '#db/queries/bookings';
import { putWeekNoteRow } from '#db/queries/week-notes';
import type { ScopedBranch } from '#db/scope';
import type { Store } from '#db/store';
import { acceptClaim } from '#db/accept-claim';
import { acceptJob, type Sending } from '#db/accept-job';
import { readJob } from '#shared/contracts/check-job';
import type { JobContent } from '#shared/contracts/jobs';
import { breaksOfClaim } from '#shared/domain/claim-rules';
import type { JobWorld } from '#shared/domain/job-rules';
import type { BranchHistory, DemoClaim, DemoWeekNote } from './demo-network';
import { markEvents } from './load-come-back-marks';
import type { Senders } from './load-people';

/** Something that reached the network after a job's first arrival, to be done in the order of its moment. */
export interface LaterEvent {
  at: string;
  happen: () => void;
}

/** What the loader needs of the network to load one branch into it. */
export interface Loading {
  store: Store;
  branch: ScopedBranch;
  senders: Senders;
  world: JobWorld;
  claimLimitCents: number;
}

const NO_CONDITIONS: Sending['preconditions'] = {
  ifMatch: undefined,
  ifNoneMatch: undefined,
  lastChange: () => '',
};

/**
 * Takes the first version of every job of a branch into the record, by the same acceptance as a job that is pushed, and its
 * bookings; gives what happened later, so that the trail can tell it across branches in time order. Runs inside a write.
 */
export function loadHistory(loading: Loading, history: BranchHistory): LaterEvent[] {
  const { store, branch, senders } = loading;
  const writer = new BranchWriter(store, branch);
  const later: LaterEvent[] = [];
  for (const { jobRef, content, receivedAt, corrections = [], voided } of history.jobs) {
    const accept = (version: JobContent, receipt: Receipt): void => {
      acceptJob(writer, jobRef, checked(version, loading), {
        ...receipt,
        money: 'seen',
        preconditions: NO_CONDITIONS,
      });
    };
    accept(content, byKey(senders, receivedAt));
    for (const correction of corrections) {
      const at = correction.receivedAt;
      later.push({ at, happen: () => accept(correction.content, byHand(senders, at)) });
    }
    if (voided) {
      const { at } = voided;
      later.push({
        at,
        happen: () => {
          const stored = writer.findJob(jobRef);
          if (stored) writer.voidJob(jobRef, stored, byHand(senders, at));
        },
      });
    }
  }
  loadBookings(loading, history);
  return [
    ...later,
    ...claimEvents(loading, history.claims),
    ...noteEvents(loading, history.weekNotes),
    ...markEvents(loading, history.comeBackMarks),
  ];
}

function claimEvents(loading: Loading, claims: readonly DemoClaim[]): LaterEvent[] {
  const { store, branch, senders, claimLimitCents, world } = loading;
  const writer = new ClaimWriter(store, branch);
  return claims.map(({ claimRef, content, receivedAt }) => ({
    at: receivedAt,
    happen: () => {
      refuseBroken(claimRef, breaksOfClaim(content, world.today));
      acceptClaim(writer, claimRef, content, {
        ...byKey(senders, receivedAt),
        role: 'site_manager',
        limitCents: claimLimitCents,
      });
    },
  }));
}

function noteEvents(loading: Loading, notes: readonly DemoWeekNote[]): LaterEvent[] {
  const { store, branch, senders } = loading;
  const personId = senders.managerId;
  if (personId === undefined) return [];
  return notes.map(({ week, text, changedAt }) => ({
    at: changedAt,
    happen: () => {
      putWeekNoteRow(store.unscoped, branch, { week, text, personId, changedAt });
      recordAudit(store.unscoped, {
        at: changedAt,
        actor: senders.mender,
        action: 'week.note',
        subject: `/branches/${branch.code}/weeks/${week}/note`,
        branchId: branch.id,
        detail: { before: null, after: text },
      });
    },
  }));
}

function loadBookings({ store, branch }: Loading, history: BranchHistory): void {
  for (const { ref, content } of history.bookings) {
    const entry = store.state.package(content.package);
    if (!entry) throw new Error(`the demo books a package it does not sell: ${content.package}`);
    const { expectedOn, bodyType } = content;
    putBookingRow(store.unscoped, branch, { ref, expectedOn, packageId: entry.id, bodyType });
  }
}

/** Holds a job to the rules that a pushed one is held to: demo data that they would refuse must not get in by the back. */
function checked(content: JobContent, { branch, world }: Loading): JobContent {
  const read = readJob(content, world);
  if ('content' in read) return read.content;
  refuseBroken(`${branch.code} ${content.completedOn}`, read.problems);
  return content;
}

function refuseBroken(what: string, problems: readonly { path: string; message: string }[]): void {
  const [first] = problems;
  if (first) throw new Error(`the demo's ${what} breaks a rule: ${first.path} ${first.message}`);
}

function byKey(senders: Senders, receivedAt: string): Receipt {
  return { actor: senders.system, source: 'key', receivedAt };
}

function byHand({ mender }: Senders, receivedAt: string): Receipt {
  return { actor: mender, source: mender.personId === null ? 'key' : 'person', receivedAt };
}

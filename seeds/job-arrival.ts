import type { JobContent } from '#shared/contracts/jobs';
import { dateOfDay } from '#shared/domain/calendar';
import { billDelayDays } from './bills';
import type { DemoJob, DemoRevision } from './demo-network';
import type { DrawnJob } from './draw-job';
import { chance, pick, wholeBetween, type Random } from './random-draws';
import { workingDayAfter, type WorkWeek } from './working-calendar';

/** Where a job arrives: at which branch, under which reference, seen from which day. */
export interface Arrival {
  branchCode: string;
  jobRef: string;
  invoiceNumber: string;
  completedDay: number;
  /** Day number of today; nothing arrives on it or later. */
  todayDay: number;
  workWeek: WorkWeek;
  billDelay: number;
}

/** Days that a finished job may wait for its bill and still be sent once, with it; a later bill comes as a correction. */
const SENT_WITH_BILL_DAYS = 10;

/**
 * How the network comes to know a job: sent in the evening with its bill, or without one and corrected when the bill is
 * written; a few are sent with a mistake first, a few are voided.
 */
export function arrive(random: Random, drawn: DrawnJob, at: Arrival): DemoJob {
  const delay = billDelayDays(random, at.billDelay);
  const billDay = workingDayAfter(at.completedDay + delay, at.workWeek);
  const billed = billDay < at.todayDay;
  const once = billed && billDay - at.completedDay <= SENT_WITH_BILL_DAYS;
  const versions: DemoRevision[] = [];
  const bill = (content: JobContent): JobContent => ({
    ...content,
    invoice: {
      number: at.invoiceNumber,
      issuedOn: dateOfDay(billDay),
      totalCents: drawn.billCents,
    },
  });
  const sentDay = once ? billDay : at.completedDay;
  const right = once ? bill(drawn.content) : drawn.content;
  const mendedDay = sentDay + wholeBetween(random, 1, 6);
  if (chance(random, 0.01) && mendedDay < at.todayDay && (!billed || once || mendedDay < billDay)) {
    versions.push(version(random, mistaken(random, right), sentDay));
    versions.push(version(random, right, mendedDay));
  } else {
    versions.push(version(random, right, sentDay));
  }
  if (billed && !once) versions.push(version(random, bill(right), billDay));
  const [first, ...corrections] = versions as [DemoRevision, ...DemoRevision[]];
  const voidDay = Math.max(sentDay, billed ? billDay : 0) + wholeBetween(random, 7, 20);
  const voided = chance(random, 0.003) && voidDay < at.todayDay;
  return {
    branchCode: at.branchCode,
    jobRef: at.jobRef,
    ...first,
    ...(corrections.length > 0 && { corrections }),
    ...(voided && { voided: { at: evening(random, voidDay) } }),
  };
}

/** A moment in the evening of a day, when a branch's own system sends. */
export function evening(random: Random, day: number): string {
  const hour = wholeBetween(random, 16, 19);
  const minute = String(wholeBetween(random, 0, 59)).padStart(2, '0');
  const second = String(wholeBetween(random, 0, 59)).padStart(2, '0');
  return `${dateOfDay(day)}T${hour}:${minute}:${second}.000Z`;
}

function version(random: Random, content: JobContent, day: number): DemoRevision {
  return { content, receivedAt: evening(random, day) };
}

/** The same job with one of the mistakes that people make when they write it down. */
function mistaken(random: Random, right: JobContent): JobContent {
  const kind = pick(random, ['apply', 'ml', 'clips'] as const);
  if (kind === 'ml' && right.products?.[0]) {
    const [first, ...rest] = right.products;
    return { ...right, products: [{ ...first, ml: first.ml * 10 }, ...rest] };
  }
  if (kind === 'clips') {
    return { ...right, consumables: [] };
  }
  const apply = (right.actual.stages.apply ?? 0) + 60;
  return { ...right, actual: { stages: { ...right.actual.stages, apply } } };
}

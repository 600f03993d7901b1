import { dateOfDay, dayNumber } from '#shared/domain/calendar';
import { referenced } from '#shared/domain/normalise-job';
import type { RecordedFinding } from '#shared/domain/recorded-job';
import type { ComeBackStatus } from '#shared/domain/vocabulary';
import type { Mark } from '#db/come-back-writer';
import type { JobContent } from '#shared/contracts/jobs';
import { newestContent, type DemoComeBackMark, type DemoJob } from './demo-network';
import { evening } from './job-arrival';
import { chance, pick, pickWeighted, wholeBetween, type Random } from './random-draws';

type Outcome = readonly (readonly [ComeBackStatus, number])[];

/** How far the calling has got with cars seen so long ago, in days: what is old has mostly been dealt with. Invented. */
const OUTCOMES: readonly { from: number; outcome: Outcome }[] = [
  { from: 400, outcome: weighed({ done: 47, gone: 42, contacted: 7, booked: 0, open: 4 }) },
  { from: 60, outcome: weighed({ done: 9, gone: 15, contacted: 38, booked: 13, open: 25 }) },
  { from: 14, outcome: weighed({ done: 0, gone: 2, contacted: 34, booked: 16, open: 48 }) },
  { from: 0, outcome: weighed({ done: 0, gone: 0, contacted: 12, booked: 6, open: 82 }) },
];

/** Of a car that came back and had it mended: how it was said to stand before. */
const CAME_BACK: Outcome = weighed({ done: 0, gone: 0, contacted: 35, booked: 50, open: 15 });

/** What people write with a mark. Invented. */
const NOTES: Record<ComeBackStatus, readonly string[]> = {
  open: [''],
  contacted: [
    'Rang the owner, who will think it over.',
    'Left a message with what we found.',
    'Owner wants it done before winter, ring again in autumn.',
    'Sent the price by post.',
    'Owner is away until next month.',
    '',
  ],
  booked: [
    'Comes in for the welding, a day set aside.',
    'Owner brings it with the next top-up.',
    'Booked, needs a loan car.',
    '',
  ],
  done: [
    'Welded at another workshop, saw the bill.',
    'Owner had it repaired and sent a picture.',
    'Looked at again, the repair holds.',
  ],
  gone: ['Sold, new owner not known.', 'Scrapped.', 'Wrote twice, no answer.', 'Owner moved away.'],
};

/**
 * What the branch has said of the rot it left on cars, one owner at a time: nearly every owner of a load-bearing part was told
 * in writing, and what is older than a year is mostly closed.
 */
export function drawComeBackMarks(
  random: Random,
  jobs: readonly DemoJob[],
  today: string,
): DemoComeBackMark[] {
  const visits = new Visits(jobs);
  return jobs.flatMap((job) => {
    const left = leftIn(newestContent(job));
    if (job.voided || left.length === 0) return [];
    const mended = left.map((finding) => visits.mendedDay(job, finding));
    const said = drawMarks(random, job, dayNumber(today), visits.laterDay(job), mended);
    return left.flatMap(({ ref }, n) => {
      // What was not mended when the rest was, somebody looked at.
      const back = mended[n] === undefined ? Math.max(...mended.map((day) => day ?? 0)) : 0;
      const all = back > 0 ? [...said, lookedAt(random, said.at(-1)?.mark, back)] : said;
      return all
        .filter(({ changedAt }) => changedAt < today)
        .map((one) => ({ jobRef: job.jobRef, ref, ...one }));
    });
  });
}

type Said = Pick<DemoComeBackMark, 'mark' | 'changedAt'>;

/** The marks of one car, the same on all that was left on it. */
function drawMarks(
  random: Random,
  job: DemoJob,
  todayDay: number,
  laterDay: number,
  mended: readonly (number | undefined)[],
): Said[] {
  const content = newestContent(job);
  const finished = dayNumber(content.completedOn);
  const firstDay = dayNumber(job.receivedAt.slice(0, 10)) + wholeBetween(random, 0, 6);
  const dangerous = leftIn(content).some(({ structural }) => structural);
  const told = chance(random, dangerous ? 0.93 : 0.12);
  // Mostly the sheet that is handed over with the car.
  const toldDay = chance(random, 0.75) ? finished : firstDay;
  const ownerToldOn = told ? dateOfDay(toldDay) : null;
  const first: Said = {
    mark: { status: 'open', dueOn: null, note: '', ownerToldOn },
    changedAt: evening(random, firstDay),
  };
  const said = told ? [first] : [];
  const back = Math.min(...mended.map((day) => day ?? Infinity));
  const comesBack = back < Infinity;
  const age = todayDay - finished;
  const status = pickWeighted(random, comesBack ? CAME_BACK : outcomeAt(age));
  // Nobody writes a car off that is seen again later.
  const from = comesBack ? firstDay : Math.max(firstDay, laterDay);
  const days = comesBack ? back - from - 1 : Math.min(330, age - 10);
  const lastDay = from + wholeBetween(random, 1, Math.max(1, days));
  if (status === 'open' || lastDay >= Math.min(back, todayDay)) return said;
  const dueDay = comesBack ? back : dueDayOf(random, status, lastDay, todayDay);
  const dueOn = dueDay === null ? null : dateOfDay(dueDay);
  const note = pick(random, NOTES[status]);
  return [
    ...said,
    { mark: { status, dueOn, note, ownerToldOn }, changedAt: evening(random, lastDay) },
  ];
}

function lookedAt(random: Random, before: Mark | undefined, day: number): Said {
  const ownerToldOn = before?.ownerToldOn ?? dateOfDay(day);
  const note = 'Looked at again when it was back.';
  return {
    mark: { status: 'done', dueOn: null, note, ownerToldOn },
    changedAt: evening(random, day + 1),
  };
}

/** When it is to be looked at again: a booking soon, a call within months, some of them overdue by now. */
function dueDayOf(
  random: Random,
  status: ComeBackStatus,
  markedDay: number,
  todayDay: number,
): number | null {
  if (status === 'booked') return todayDay + wholeBetween(random, 1, 35);
  if (status !== 'contacted' || chance(random, 0.35)) return null;
  return Math.max(markedDay + wholeBetween(random, 30, 200), todayDay - 45);
}

function leftIn(content: JobContent): RecordedFinding[] {
  return referenced(content.findings ?? []).filter(
    ({ action }) => action === 'deferred' || action === 'declined',
  );
}

function outcomeAt(age: number): Outcome {
  const found = OUTCOMES.find(({ from }) => age >= from);
  return (found ?? OUTCOMES[OUTCOMES.length - 1])?.outcome ?? [];
}

function weighed(weights: Record<ComeBackStatus, number>): Outcome {
  return Object.entries(weights) as [ComeBackStatus, number][];
}

/** When each car was at the branch, and when what was mended on it. */
class Visits {
  private readonly seen = new Map<string, number>();
  private readonly mended = new Map<string, number[]>();

  constructor(jobs: readonly DemoJob[]) {
    for (const job of jobs) {
      if (job.voided) continue;
      const { vehicle, completedOn, findings = [] } = newestContent(job);
      const day = dayNumber(completedOn);
      const key = vehicle.key ?? '';
      this.seen.set(key, Math.max(day, this.seen.get(key) ?? 0));
      for (const { zone, side, action } of findings) {
        if (action !== 'treated' && action !== 'patched') continue;
        const place = `${key} ${zone} ${side}`;
        this.mended.set(place, [...(this.mended.get(place) ?? []), day]);
      }
    }
  }

  /** The day on which the car of a job was seen last. */
  laterDay(job: DemoJob): number {
    return this.seen.get(newestContent(job).vehicle.key ?? '') ?? 0;
  }

  /** The first later day on which the place of a finding was mended on the same car. */
  mendedDay(job: DemoJob, { zone, side }: RecordedFinding): number | undefined {
    const { vehicle, completedOn } = newestContent(job);
    const days = this.mended.get(`${vehicle.key ?? ''} ${zone} ${side}`) ?? [];
    const later = days.filter((day) => day > dayNumber(completedOn));
    return later.length > 0 ? Math.min(...later) : undefined;
  }
}

import { ActionWriter, type ActionDeed, type AgreedAction } from '#db/action-writer';
import { setNetworkTarget, TargetWriter } from '#db/target-writer';
import type { ScopedBranch } from '#db/scope';
import type { Store } from '#db/store';
import { addDays } from '#shared/domain/calendar';
import type { TargetMeasure } from '#shared/domain/target-measures';
import { DEMO_PEOPLE, managerOf, type DemoPerson } from './demo-people';
import type { LaterEvent } from './load-history';

/** An action of the demo, in days before and after the day it is seen from. Invented. */
interface DemoAction extends Omit<AgreedAction, 'until'> {
  branch: string;
  by: 'regional_lead' | 'head_office';
  agreedBack: number;
  untilBack: number;
  /** What the branch's manager says, so many days later. */
  answers: readonly { daysLater: number; text: string }[];
  /** Done so many days ago. */
  doneBack?: number;
}

const ACTIONS: readonly DemoAction[] = [
  {
    branch: 'SKU',
    by: 'head_office',
    what: 'Trim, liners and clips laid out by car at strip, so that refit does not search for them.',
    who: 'Whole workshop',
    measure: 'overrun',
    agreedBack: 80,
    untilBack: -25,
    answers: [],
  },
  {
    branch: 'TEG',
    by: 'regional_lead',
    what: 'No price given away at the counter without the site manager; each one noted with its reason.',
    who: 'Counter',
    measure: 'margin',
    agreedBack: 70,
    untilBack: 8,
    answers: [],
  },
  {
    branch: 'HAV',
    by: 'regional_lead',
    what: 'Photos of rot to the owner before repair begins, extras agreed in writing the same day.',
    who: 'Site manager and counter',
    measure: 'margin',
    agreedBack: 96,
    untilBack: -20,
    answers: [
      { daysLater: 9, text: 'Photos go out with every car since this week.' },
      { daysLater: 61, text: 'Owners mostly answer within the hour. Two bills are still open.' },
    ],
  },
  {
    branch: 'HAV',
    by: 'regional_lead',
    what: 'Fill level of each gun written on the job sheet before and after.',
    who: 'Both sprayers',
    measure: 'product',
    agreedBack: 230,
    untilBack: 150,
    answers: [{ daysLater: 20, text: 'Sheets are printed with the two lines.' }],
    doneBack: 157,
  },
];

/** Targets besides the margin's, which is part of the set-up. Invented. */
const TARGETS: readonly (readonly [TargetMeasure, number])[] = [
  ['overrun', 1.15],
  ['product', 1],
];

/** What the demo's lead and head office agreed and want, as later events, each written after the ones before it. */
export function actionEvents(
  store: Store,
  people: ReadonlyMap<string, number>,
  today: string,
): LaterEvent[] {
  const [lead, office] = [personOf('regional_lead'), personOf('head_office')];
  const wanted = `${addDays(today, -300)}T10:20:00.000Z`;
  const targets = TARGETS.map(([measure, value]) => ({
    at: wanted,
    happen: () => {
      const deed = { ...deedOf(people, office, wanted), subject: `/targets/${measure}` };
      setNetworkTarget(store, measure, value, deed);
    },
  }));
  const eased = `${addDays(today, -80)}T09:45:00.000Z`;
  const ofBranch: LaterEvent = {
    at: eased,
    happen: () => {
      const subject = '/branches/TEG/targets/overrun';
      const deed = { ...deedOf(people, lead, eased), subject };
      new TargetWriter(store, branchOf(store, 'TEG')).set('overrun', 1.2, deed);
    },
  };
  return [
    ...targets,
    ofBranch,
    ...ACTIONS.flatMap((action) => eventsOf(store, people, action, today)),
  ];
}

function eventsOf(
  store: Store,
  people: ReadonlyMap<string, number>,
  { branch, by, agreedBack, untilBack, answers, doneBack, ...agreed }: DemoAction,
  today: string,
): LaterEvent[] {
  const agreeing = personOf(by);
  const writer = new ActionWriter(store, branchOf(store, branch));
  const agreedOn = addDays(today, -agreedBack);
  const until = addDays(today, -untilBack);
  let id = 0;
  const agreedAt = `${agreedOn}T09:30:00.000Z`;
  const events: LaterEvent[] = [
    {
      at: agreedAt,
      happen: () => {
        const deed = deedOf(people, agreeing, agreedAt);
        id = writer.agree({ ...agreed, until }, agreedOn, null, deed);
      },
    },
  ];
  const manager = managerOf(branch);
  for (const { daysLater, text } of manager ? answers : []) {
    const at = `${addDays(agreedOn, daysLater)}T16:10:00.000Z`;
    events.push({ at, happen: () => writer.answer(id, text, deedOf(people, manager, at)) });
  }
  if (doneBack !== undefined) {
    const doneOn = addDays(today, -doneBack);
    const at = `${doneOn}T09:10:00.000Z`;
    events.push({
      at,
      happen: () => {
        const before = writer.find(id);
        if (!before) throw new Error(`the demo ends an action that it does not have at ${branch}`);
        writer.change(
          before,
          { ...agreed, until, state: 'done' },
          doneOn,
          deedOf(people, agreeing, at),
        );
      },
    });
  }
  return events;
}

function personOf(role: DemoPerson['role']): DemoPerson {
  const person = DEMO_PEOPLE.find((one) => one.role === role);
  if (!person) throw new Error(`the demo has no ${role}`);
  return person;
}

function branchOf(store: Store, code: string): ScopedBranch {
  const branch = store.state.branches.find((one) => one.code === code);
  if (!branch) throw new Error(`the demo has no branch ${code}`);
  return branch;
}

function deedOf(
  people: ReadonlyMap<string, number>,
  person: DemoPerson | undefined,
  at: string,
): ActionDeed {
  const personId = people.get(person?.email ?? '');
  if (!person || personId === undefined) throw new Error('the demo has no such person');
  return {
    actor: { label: person.email, personId, pushKeyId: null, address: 'demo data' },
    at,
  };
}

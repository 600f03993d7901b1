import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { code, date, MANAGERS, noQuery, prose, READERS, scopeQuery } from './fields';
import { isWeek } from '#shared/domain/calendar';

const week = z.string().refine(isWeek, 'a week is written YYYY-Www');

/** What a manager wrote about a week of a branch. */
export const weekNote = z.strictObject({
  branch: code,
  week,
  text: z.string(),
  by: z.string(),
  changedAt: z.string(),
});

export const putWeekNote = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/weeks/:week/note',
  topic: 'Weeks',
  summary: 'Leave or change the note on a week; an empty text removes it.',
  access: MANAGERS,
  scope: 'branches',
  params: z.strictObject({ branch: z.string(), week }),
  query: noQuery,
  body: z.strictObject({ text: prose }),
  out: z.strictObject({ note: weekNote.nullable() }),
  statuses: [200],
});

export const listWeekNotes = defineEndpoint({
  method: 'get',
  path: '/api/week-notes',
  topic: 'Weeks',
  summary: 'Notes on the weeks that touch a period, in scope, newest week first.',
  access: READERS,
  scope: 'branches',
  params: z.strictObject({}),
  query: z.strictObject({
    from: date,
    to: date,
    region: scopeQuery.shape.region,
    branch: scopeQuery.shape.branch,
  }),
  body: null,
  out: z.strictObject({ items: z.array(weekNote) }),
  statuses: [200],
});

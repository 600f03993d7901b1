import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  branchParams,
  code,
  date,
  EVERYONE,
  noQuery,
  packageCode,
  reference,
  SENDERS,
} from './fields';

/** A car expected at a branch (rule 75): no more than product planning needs. */
export const bookingContent = z.strictObject({
  expectedOn: date,
  package: packageCode,
  bodyType,
});
const params = z.strictObject({ branch: z.string(), ref: reference });
const booking = bookingContent.extend({ branch: code, ref: z.string() });

export const putBooking = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/bookings/:ref',
  topic: 'Bookings',
  summary: 'Say that a car is expected, or change when and what.',
  access: SENDERS,
  scope: 'branches',
  params,
  query: noQuery,
  body: bookingContent,
  out: booking,
  statuses: [201, 200],
});

export const deleteBooking = defineEndpoint({
  method: 'delete',
  path: '/api/branches/:branch/bookings/:ref',
  topic: 'Bookings',
  summary: 'Take a booking back.',
  access: SENDERS,
  scope: 'branches',
  params,
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
});

export const listBookings = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/bookings',
  topic: 'Bookings',
  summary: 'Cars expected at a branch from today on, soonest first.',
  access: EVERYONE,
  scope: 'branches',
  params: branchParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ items: z.array(booking) }),
  statuses: [200],
});

import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import {
  bodyType,
  branchParams,
  cents,
  code,
  date,
  line,
  millilitres,
  month,
  SENDERS,
} from './fields';
import { quoteBasis } from './quote';
import { consumableKind } from './set-up';
import { STAGES } from '#shared/domain/vocabulary';

/** Where the middle of such cars lies and where nearly all of them do (2.5, 50 and 97.5 % quantiles, type 7); null without enough cars. */
const range = {
  low: z.number().nullable(),
  usual: z.number().nullable(),
  high: z.number().nullable(),
};

/** What such a car usually takes, to offer first and to warn by; never a reason to refuse. */
export const usualCar = z.strictObject({
  basis: quoteBasis,
  /** Minutes by stage, over cars with minutes in it. */
  stages: z.array(z.strictObject({ stage: z.enum(STAGES), ...range })),
  /** Minutes of the whole car. */
  total: z.strictObject(range),
  /** Millilitres a car, over cars that list the product. */
  products: z.array(z.strictObject({ product: code, ...range })),
  /** Pieces a car, over cars that list the kind. */
  consumables: z.array(z.strictObject({ kind: consumableKind, ...range })),
  /** Of the branch's newest job with this package, on this body type where there is one. */
  lastTime: z
    .strictObject({
      completedOn: date,
      products: z.array(z.strictObject({ product: code, ml: millilitres })),
      estimate: z
        .strictObject({
          priceCents: cents,
          stages: z.record(z.enum(STAGES), z.int()),
        })
        .nullable(),
      temperatureC: z.number().nullable(),
      humidityPct: z.number().nullable(),
    })
    .nullable(),
});
export type UsualCar = z.output<typeof usualCar>;

export const getUsual = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/usual',
  topic: 'Sending jobs by hand',
  summary:
    'What such a car usually takes at this branch or, with enough others behind it, in the network; and what was used last time.',
  access: { ...SENDERS, pushKey: false },
  scope: 'network-reference',
  params: branchParams,
  query: z.strictObject({
    make: line(60),
    model: line(60),
    firstRegistered: month,
    bodyType,
    package: z.string().max(64),
  }),
  body: null,
  out: usualCar,
  statuses: [200],
});

import * as z from 'zod';
import { defineEndpoint } from './endpoint';
import { claimParams } from './claims';
import { EVERYONE, noQuery, reference, SENDERS } from './fields';

/** Largest photo taken, in bytes. */
export const LARGEST_PHOTO = 10 * 1024 * 1024;
/** Most photos of one job. */
export const MOST_PHOTOS = 200;

const params = z.strictObject({ branch: z.string(), jobRef: reference, photo: reference });

/** A photo as kept: re-encoded, so that it says neither where nor with what it was taken. */
export const photo = z.strictObject({
  /** The sender's own reference of the photo within its job; makes sending safe to repeat. */
  photo: z.string(),
  /** The finding it shows, by its reference, or the car as a whole. */
  finding: z.string().nullable(),
  width: z.int(),
  height: z.int(),
  bytes: z.int(),
  receivedAt: z.string(),
  by: z.string(),
});
export type Photo = z.output<typeof photo>;

export const putPhoto = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/jobs/:jobRef/photos/:photo',
  topic: 'Photos',
  summary:
    'Send a photo (JPEG or PNG, at most 10 MB) of a job or of one of its findings; the job is accepted or under way. Kept without metadata.',
  access: SENDERS,
  scope: 'branches',
  params,
  query: z.strictObject({ finding: reference.optional() }),
  body: 'image',
  out: photo,
  statuses: [201, 200],
});

export const listPhotos = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/jobs/:jobRef/photos',
  topic: 'Photos',
  summary: 'The photos of a job, accepted or under way.',
  access: EVERYONE,
  scope: 'branches',
  params: z.strictObject({ branch: z.string(), jobRef: reference }),
  query: noQuery,
  body: null,
  out: z.strictObject({ items: z.array(photo) }),
  statuses: [200],
});

export const getPhoto = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/jobs/:jobRef/photos/:photo',
  topic: 'Photos',
  summary: 'A photo as JPEG, whole or small.',
  access: EVERYONE,
  scope: 'branches',
  params,
  query: z.strictObject({ size: z.enum(['small', 'whole']).default('whole') }),
  body: null,
  out: 'image',
  statuses: [200],
});

export const removePhoto = defineEndpoint({
  method: 'delete',
  path: '/api/branches/:branch/jobs/:jobRef/photos/:photo',
  topic: 'Photos',
  summary: 'Take a photo off a job.',
  access: { ...SENDERS, pushKey: false },
  scope: 'branches',
  params,
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
});

/** A photo of a claim. */
export const claimPhoto = photo.omit({ finding: true });
export type ClaimPhoto = z.output<typeof claimPhoto>;

const claimPhotoParams = claimParams.extend({ photo: reference });

export const putClaimPhoto = defineEndpoint({
  method: 'put',
  path: '/api/branches/:branch/claims/:claimRef/photos/:photo',
  topic: 'Photos',
  summary: 'Send a photo (JPEG or PNG, at most 10 MB) of a claim. Kept without metadata.',
  access: SENDERS,
  scope: 'branches',
  params: claimPhotoParams,
  query: noQuery,
  body: 'image',
  out: claimPhoto,
  statuses: [201, 200],
});

export const listClaimPhotos = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/claims/:claimRef/photos',
  topic: 'Photos',
  summary: 'The photos of a claim.',
  access: EVERYONE,
  scope: 'branches',
  params: claimParams,
  query: noQuery,
  body: null,
  out: z.strictObject({ items: z.array(claimPhoto) }),
  statuses: [200],
});

export const getClaimPhoto = defineEndpoint({
  method: 'get',
  path: '/api/branches/:branch/claims/:claimRef/photos/:photo',
  topic: 'Photos',
  summary: 'A photo of a claim as JPEG, whole or small.',
  access: EVERYONE,
  scope: 'branches',
  params: claimPhotoParams,
  query: z.strictObject({ size: z.enum(['small', 'whole']).default('whole') }),
  body: null,
  out: 'image',
  statuses: [200],
});

export const removeClaimPhoto = defineEndpoint({
  method: 'delete',
  path: '/api/branches/:branch/claims/:claimRef/photos/:photo',
  topic: 'Photos',
  summary: 'Take a photo off a claim.',
  access: { ...SENDERS, pushKey: false },
  scope: 'branches',
  params: claimPhotoParams,
  query: noQuery,
  body: null,
  out: 'nothing',
  statuses: [204],
});

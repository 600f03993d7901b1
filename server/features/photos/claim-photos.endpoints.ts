import type { Deed } from '#db/queries/audit';
import type { Scope, ScopedBranch } from '#db/scope';
import {
  getClaimPhoto,
  listClaimPhotos,
  putClaimPhoto,
  removeClaimPhoto,
} from '#shared/contracts/photos';
import { deedOf } from '../../http/deed';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { photoBytesOf } from '../../storage/photo-bytes';
import { PhotoDesk, tellClaimPhoto, type PhotoSpot } from './photo-desk';

/** Photos of claims: sent, listed, shown and taken off. */
export function mountClaimPhotos(mounting: Mounting, kit: Kit): void {
  const desk = new PhotoDesk(kit.store, photoBytesOf(kit.photos));
  const exists = ({ branch, ...named }: Named): boolean =>
    branch !== undefined && desk.stands(spotOf({ branch, ...named }));

  mount(
    mounting,
    putClaimPhoto,
    async (call) => {
      const { place, branch } = spotOf(call);
      const sent = { place, photo: call.params.photo, finding: null, bytes: call.body.bytes };
      const { status, body } = await desk.put(branch, sent, deedOn(call));
      return { status, body: tellClaimPhoto(body) };
    },
    { exists },
  );

  mount(
    mounting,
    listClaimPhotos,
    (call) => ({ body: { items: desk.list(spotOf(call)).map(tellClaimPhoto) } }),
    { exists },
  );

  mount(
    mounting,
    getClaimPhoto,
    async (call) => ({
      body: await desk.bytes(spotOf(call), call.params.photo, call.query.size),
    }),
    { exists },
  );

  mount(
    mounting,
    removeClaimPhoto,
    async (call) => {
      await desk.remove(spotOf(call), call.params.photo, deedOn(call));
      return {};
    },
    { exists },
  );
}

interface Named {
  branch: ScopedBranch | undefined;
  scope: Scope;
  params: { claimRef: string };
}

function spotOf(named: Named): PhotoSpot {
  const place = { of: 'claim', ref: named.params.claimRef } as const;
  return { branch: namedBranch(named), scope: named.scope, place };
}

/** As the trail names it. */
function deedOn(call: Call<{ claimRef: string; photo: string }>): Deed {
  const { claimRef, photo } = call.params;
  return deedOf(call, `/branches/${namedBranch(call).code}/claims/${claimRef}/photos/${photo}`);
}

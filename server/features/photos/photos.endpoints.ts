import type { Deed } from '#db/queries/audit';
import type { Scope, ScopedBranch } from '#db/scope';
import { getPhoto, listPhotos, putPhoto, removePhoto } from '#shared/contracts/photos';
import { deedOf } from '../../http/deed';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { photoBytesOf } from '../../storage/photo-bytes';
import { PhotoDesk, type PhotoSpot } from './photo-desk';

/** Photos of jobs and of their findings (rule 78): sent, listed, shown and taken off. */
export function mountPhotos(mounting: Mounting, kit: Kit): void {
  const desk = new PhotoDesk(kit.store, photoBytesOf(kit.photos));
  const exists = ({ branch, ...named }: Named): boolean =>
    branch !== undefined && desk.stands(spotOf({ branch, ...named }));

  mount(
    mounting,
    putPhoto,
    (call) => {
      const { photo } = call.params;
      const { place, branch } = spotOf(call);
      const sent = { place, photo, finding: call.query.finding ?? null, bytes: call.body.bytes };
      return desk.put(branch, sent, deedOn(call));
    },
    { exists },
  );

  mount(mounting, listPhotos, (call) => ({ body: { items: desk.list(spotOf(call)) } }), { exists });

  mount(
    mounting,
    getPhoto,
    async (call) => ({
      body: await desk.bytes(spotOf(call), call.params.photo, call.query.size),
    }),
    { exists },
  );

  mount(
    mounting,
    removePhoto,
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
  params: { jobRef: string };
}

function spotOf(named: Named): PhotoSpot {
  const place = { of: 'job', ref: named.params.jobRef } as const;
  return { branch: namedBranch(named), scope: named.scope, place };
}

/** As the trail names it. */
function deedOn(call: Call<{ jobRef: string; photo: string }>): Deed {
  const { jobRef, photo } = call.params;
  return deedOf(call, `/branches/${namedBranch(call).code}/jobs/${jobRef}/photos/${photo}`);
}

import { inject, Injectable } from '@angular/core';
import { filter, firstValueFrom, map } from 'rxjs';
import type { OutOf } from '#shared/contracts/endpoint';
import {
  type ClaimPhoto,
  getClaimPhoto,
  listClaimPhotos,
  removeClaimPhoto,
} from '#shared/contracts/photos';
import { Api } from '../api/api';
import type { Reading } from '../api/reading';

/** The claim whose photos are meant. */
export interface PhotographedClaim {
  readonly branch: string;
  readonly claimRef: string;
}

/** The photos the server keeps of a claim, fetched with the token that a plain picture could not carry. */
@Injectable({ providedIn: 'root' })
export class ClaimPhotos {
  private readonly api = inject(Api);

  /** Keeps the list of a claim's photos. Call it in an injection context. */
  list(claim: () => PhotographedClaim | undefined): Reading<OutOf<typeof listClaimPhotos>> {
    return this.api.read(listClaimPhotos, () => {
      const of = claim();
      return of && { params: { branch: of.branch, claimRef: of.claimRef } };
    });
  }

  /** The bytes of one. */
  bytes(claim: PhotographedClaim, { photo }: ClaimPhoto, size: 'small' | 'whole'): Promise<Blob> {
    const params = { branch: claim.branch, claimRef: claim.claimRef, photo };
    return firstValueFrom(
      this.api.download(getClaimPhoto, { params, query: { size } }).pipe(
        filter((step) => step.kind === 'whole'),
        map(({ file }) => file),
      ),
    );
  }

  /** Takes one off the claim. */
  async remove({ branch, claimRef }: PhotographedClaim, photo: string): Promise<void> {
    await firstValueFrom(this.api.call(removeClaimPhoto, { params: { branch, claimRef, photo } }));
  }
}

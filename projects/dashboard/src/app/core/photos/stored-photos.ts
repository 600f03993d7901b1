import { inject, Injectable } from '@angular/core';
import { filter, firstValueFrom, map } from 'rxjs';
import { getPhoto, listPhotos, type Photo, removePhoto } from '#shared/contracts/photos';
import { Api } from '../api/api';
import type { Reading } from '../api/reading';
import type { OutOf } from '#shared/contracts/endpoint';

/** The job whose photos are meant. */
export interface PhotographedJob {
  readonly branch: string;
  readonly jobRef: string;
}

/** The photos the server keeps of a job, fetched with the token that a plain picture could not carry. */
@Injectable({ providedIn: 'root' })
export class StoredPhotos {
  private readonly api = inject(Api);

  /** Keeps the list of a job's photos. Call it in an injection context. */
  list(job: () => PhotographedJob | undefined): Reading<OutOf<typeof listPhotos>> {
    return this.api.read(listPhotos, () => {
      const of = job();
      return of && { params: { branch: of.branch, jobRef: of.jobRef } };
    });
  }

  /** The bytes of one. */
  bytes(job: PhotographedJob, { photo }: Photo, size: 'small' | 'whole'): Promise<Blob> {
    const params = { branch: job.branch, jobRef: job.jobRef, photo };
    return firstValueFrom(
      this.api.download(getPhoto, { params, query: { size } }).pipe(
        filter((step) => step.kind === 'whole'),
        map(({ file }) => file),
      ),
    );
  }

  /** Takes one off the job. */
  async remove({ branch, jobRef }: PhotographedJob, photo: string): Promise<void> {
    await firstValueFrom(this.api.call(removePhoto, { params: { branch, jobRef, photo } }));
  }
}

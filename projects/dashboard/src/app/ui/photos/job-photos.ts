import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { defer } from 'rxjs';
import type { Photo } from '#shared/contracts/photos';
import { deed } from '../../core/api/deed';
import { type PhotographedJob, StoredPhotos } from '../../core/photos/stored-photos';
import { Trouble } from '../trouble/trouble';
import { Photos } from './photos';
import type { ShownPhoto } from './shown-photo';

/** Photos that the server keeps of a job, or of one finding of it. */
@Component({
  selector: 'us-job-photos',
  imports: [Photos, Trouble],
  template: `
    <us-photos [photos]="shown()" (removed)="remove($event)" />
    <div role="alert">
      @if (removing.problem(); as problem) {
        <us-trouble>{{ problem.sentence }}</us-trouble>
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobPhotos {
  readonly job = input.required<PhotographedJob>();
  readonly photos = input.required<readonly Photo[]>();
  /** What they show: "sill, inner, left", or the car. */
  readonly of = input('the car');
  readonly removable = input(false);
  /** One was taken off: the list is to be read again. */
  readonly changed = output();

  private readonly stored = inject(StoredPhotos);
  protected readonly removing = deed((photo: string) =>
    defer(() => this.stored.remove(this.job(), photo).then(() => true)),
  );
  protected readonly shown = computed(() => {
    const job = this.job();
    return this.photos().map((photo, index): ShownPhoto => ({
      id: photo.photo,
      alt: `Photo ${index + 1} of ${this.of()}`,
      load: (size) => this.stored.bytes(job, photo, size),
      removable: this.removable(),
    }));
  });

  protected async remove(photo: string): Promise<void> {
    if (await this.removing.run(photo)) this.changed.emit();
  }
}

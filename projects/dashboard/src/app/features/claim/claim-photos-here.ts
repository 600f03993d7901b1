import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import type { ClaimDraft, TypedClaim } from '../../core/drafts/claim-draft';
import { type ClaimedJob, ClaimDrafts } from '../../core/drafts/claim-drafts';
import { PhotoRefused } from '../../core/drafts/photo-check';
import { Photos } from '../../ui/photos/photos';
import type { ShownPhoto } from '../../ui/photos/shown-photo';
import { TakePhotos } from '../../ui/photos/take-photos';
import { Trouble } from '../../ui/trouble/trouble';

const STATES = { here: 'kept here', sent: 'sent', refused: 'refused' } as const;

/** Photos of a claim that is being written: taken or chosen here, sent after the claim. */
@Component({
  selector: 'us-claim-photos-here',
  imports: [Photos, TakePhotos, Trouble],
  template: `
    <us-photos [photos]="shown()" (removed)="remove($event)" />
    <us-take-photos of="the claim" (taken)="add($event)" />
    <div role="alert">
      @if (refused(); as words) {
        <us-trouble>{{ words }}</us-trouble>
      }
    </div>
  `,
  styles: `
    :host {
      display: flex;
      flex-direction: column;
      gap: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimPhotosHere {
  readonly job = input.required<ClaimedJob>();
  readonly draft = input<ClaimDraft>();
  /** What is kept with the first photo, when nothing else is yet. */
  readonly typed = input.required<TypedClaim>();
  readonly changed = output<ClaimDraft | undefined>();

  private readonly drafts = inject(ClaimDrafts);
  protected readonly refused = signal<string | undefined>(undefined);
  protected readonly shown = computed(() => {
    const job = this.job();
    return (this.draft()?.photos ?? []).map((photo, index): ShownPhoto => ({
      id: photo.id,
      alt: `Photo ${index + 1} of the claim`,
      load: () => this.drafts.photo(job, photo.id),
      state: photo.problem ?? STATES[photo.state],
      removable: photo.state !== 'sent',
    }));
  });

  protected async add(files: readonly File[]): Promise<void> {
    this.refused.set(undefined);
    try {
      for (const file of files) {
        this.changed.emit(await this.drafts.addPhoto(this.job(), this.typed(), file));
      }
    } catch (error) {
      this.refused.set(
        error instanceof PhotoRefused
          ? error.message
          : 'This photo could not be kept on the device. Make room and take it again.',
      );
    }
  }

  protected async remove(photo: string): Promise<void> {
    this.changed.emit(await this.drafts.removePhoto(this.job(), photo));
  }
}

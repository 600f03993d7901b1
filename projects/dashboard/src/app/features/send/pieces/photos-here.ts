import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { Drafts } from '../../../core/drafts/drafts';
import { PhotoRefused } from '../../../core/drafts/photo-check';
import { StoredPhotos } from '../../../core/photos/stored-photos';
import { SIDE_NAMES, ZONE_NAMES } from '../../../ui/words';
import { JobPhotos } from '../../../ui/photos/job-photos';
import { Photos } from '../../../ui/photos/photos';
import type { ShownPhoto } from '../../../ui/photos/shown-photo';
import { TakePhotos } from '../../../ui/photos/take-photos';
import { Trouble } from '../../../ui/trouble/trouble';
import { OpenDraft } from '../open-draft';

const STATES = { here: 'kept here', sent: 'sent', refused: 'refused' } as const;

/** Photos of a finding: taken or chosen here, and those that the server has of it already. */
@Component({
  selector: 'us-photos-here',
  imports: [JobPhotos, Photos, TakePhotos, Trouble],
  templateUrl: './photos-here.html',
  styleUrl: './photos-here.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PhotosHere {
  /** The finding they show, or the car as a whole. */
  readonly finding = input.required<string | null>();

  private readonly draft = inject(OpenDraft);
  private readonly drafts = inject(Drafts);
  private readonly all = inject(StoredPhotos).list(() => this.job());
  protected readonly refused = signal<string | undefined>(undefined);
  /** A job that the server knows of: one that is corrected, or kept there under way. */
  protected readonly job = computed(() => {
    const kept = this.draft.kept();
    const known = kept && (kept.corrects !== undefined || kept.keptAs !== undefined);
    return known ? { branch: kept.branch, jobRef: kept.jobRef } : undefined;
  });
  protected readonly of = computed(() => {
    const { zone, side } =
      this.draft.document().findings?.find(({ ref }) => ref === this.finding()) ?? {};
    if (this.finding() === null) return 'the car';
    return [zone && ZONE_NAMES[zone], side && SIDE_NAMES[side]].filter(Boolean).join(', ');
  });
  protected readonly stored = computed(() => {
    const here = new Set(this.draft.photos().map(({ id }) => id));
    const items = this.all.value()?.items ?? [];
    return items.filter(({ finding, photo }) => finding === this.finding() && !here.has(photo));
  });
  protected readonly here = computed(() => {
    const id = this.draft.id() ?? '';
    const own = this.draft.photos().filter(({ finding }) => finding === this.finding());
    return own.map((photo, index): ShownPhoto => ({
      id: photo.id,
      alt: `Photo ${this.stored().length + index + 1} of ${this.of()}`,
      load: () => this.drafts.photo(id, photo.id),
      state: photo.problem ?? STATES[photo.state],
      removable: true,
    }));
  });

  protected readAgain(): void {
    this.all.reload();
  }

  protected async add(files: readonly File[]): Promise<void> {
    const id = this.draft.id();
    this.refused.set(undefined);
    if (id === undefined) return;
    try {
      for (const file of files) await this.drafts.addPhoto(id, this.finding(), file);
    } catch (error) {
      this.refused.set(
        error instanceof PhotoRefused
          ? error.message
          : 'This photo could not be kept on the device. Make room and take it again.',
      );
    }
  }

  protected remove(photo: string): void {
    const id = this.draft.id();
    if (id !== undefined) void this.drafts.removePhoto(id, photo);
  }
}

import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { defer, firstValueFrom } from 'rxjs';
import { putClaimPhoto } from '#shared/contracts/photos';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { newId } from '../../core/drafts/new-id';
import { PhotoRefused, readPhoto } from '../../core/drafts/photo-check';
import { ClaimPhotos } from '../../core/photos/claim-photos';
import { formatCounted } from '../../ui/format';
import { Photos } from '../../ui/photos/photos';
import type { ShownPhoto } from '../../ui/photos/shown-photo';
import { TakePhotos } from '../../ui/photos/take-photos';
import { Trouble } from '../../ui/trouble/trouble';
import { problemOf } from './send-claim';

/** A photo taken here that has not gone yet. */
interface Waiting {
  readonly id: string;
  readonly file: Blob;
}

/** The photos that the server keeps of a claim; senders add to them and take them off. */
@Component({
  selector: 'us-claim-photos-kept',
  imports: [MatButton, Photos, TakePhotos, Trouble],
  template: `
    <us-photos [photos]="shown()" (removed)="remove($event)" />
    @if (shown().length === 0 && stored.value()) {
      <p class="us-small us-quiet">None yet.</p>
    }
    @if (may() === 'change') {
      <us-take-photos of="the claim" (taken)="add($event)" />
    }
    <div role="alert">
      @if (trouble(); as words) {
        <us-trouble>{{ words }}</us-trouble>
      }
      @if (removing.problem(); as problem) {
        <us-trouble>{{ problem.sentence }}</us-trouble>
      }
      @if (waiting().length > 0 && !busy()) {
        <p class="us-small">{{ waitingWords() }}</p>
        <button matButton="outlined" type="button" (click)="sendAll()">Send again</button>
      }
    </div>
    @if (busy()) {
      <p class="us-small" role="status">Sending {{ waitingWords() }}</p>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-direction: column;
      gap: 8px;
      max-width: 480px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimPhotosKept {
  private readonly api = inject(Api);
  private readonly photos = inject(ClaimPhotos);

  readonly branch = input.required<string>();
  readonly claimRef = input.required<string>();
  readonly may = input.required<'change' | 'read'>();

  private readonly claim = computed(() => ({ branch: this.branch(), claimRef: this.claimRef() }));
  protected readonly stored = this.photos.list(this.claim);
  protected readonly waiting = signal<readonly Waiting[]>([]);
  protected readonly busy = signal(false);
  protected readonly trouble = signal<string | undefined>(undefined);
  protected readonly removing = deed((photo: string) =>
    defer(() => this.photos.remove(this.claim(), photo).then(() => true)),
  );
  protected readonly waitingWords = computed(() =>
    this.busy()
      ? formatCounted(this.waiting().length, 'photo', 'photos')
      : `${formatCounted(this.waiting().length, 'photo has', 'photos have')} not gone yet; kept while this page is open.`,
  );
  protected readonly shown = computed(() => {
    const claim = this.claim();
    return (this.stored.value()?.items ?? []).map((photo, index): ShownPhoto => ({
      id: photo.photo,
      alt: `Photo ${index + 1} of the claim`,
      load: (size) => this.photos.bytes(claim, photo, size),
      removable: this.may() === 'change',
    }));
  });

  protected async add(files: readonly File[]): Promise<void> {
    this.trouble.set(undefined);
    try {
      for (const file of files) {
        const { bytes, type } = await readPhoto(file);
        const one = { id: newId(), file: new Blob([bytes], { type }) };
        this.waiting.update((all) => [...all, one]);
      }
    } catch (error) {
      if (!(error instanceof PhotoRefused)) throw error;
      this.trouble.set(error.message);
    }
    await this.sendAll();
  }

  protected async sendAll(): Promise<void> {
    if (this.busy() || this.waiting().length === 0) return;
    this.busy.set(true);
    this.trouble.set(undefined);
    for (const { id, file } of this.waiting()) {
      try {
        await firstValueFrom(
          this.api.call(putClaimPhoto, { params: { ...this.claim(), photo: id }, body: file }),
        );
        this.waiting.update((all) => all.filter((one) => one.id !== id));
      } catch (error) {
        this.trouble.set(problemOf(error).sentence);
        break;
      }
    }
    this.busy.set(false);
    this.stored.reload();
  }

  protected async remove(photo: string): Promise<void> {
    if (await this.removing.run(photo)) this.stored.reload();
  }
}

import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { Catalogue } from '../../../core/catalogue/catalogue';
import type { DeviceDraft } from '../../../core/drafts/device-draft';
import { Drafts } from '../../../core/drafts/drafts';
import { formatInstant } from '../../../ui/format';
import { Trouble } from '../../../ui/trouble/trouble';
import { draftWords, hasRefusedPhotos } from '../draft-words';
import { carWords } from '../review-words';
import { ThrowAwayDialog, type ThrownAway } from './throw-away-dialog';

/** The jobs kept on this device, each with where it stands. */
@Component({
  selector: 'us-draft-rows',
  imports: [MatButton, RouterLink, Trouble],
  templateUrl: './draft-rows.html',
  styleUrl: './job-rows.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DraftRows {
  private readonly drafts = inject(Drafts);
  private readonly catalogue = inject(Catalogue);
  private readonly dialog = inject(MatDialog);
  protected readonly rows = computed(() =>
    this.drafts.list().map((draft) => ({
      draft,
      ...draftWords(draft),
      // Of one that is sent only photos that were refused are left here.
      removable: draft.state === 'editing' || draft.state === 'refused' || hasRefusedPhotos(draft),
      when: formatInstant(draft.changedAt),
      branch:
        this.catalogue.branches().length > 1 ? this.catalogue.branchName(draft.branch) : undefined,
    })),
  );

  protected async throwAway(draft: DeviceDraft): Promise<void> {
    const data = { car: carWords(draft.content), photos: draft.photos.length };
    const asked = this.dialog.open<ThrowAwayDialog, ThrownAway, boolean>(ThrowAwayDialog, { data });
    const sure = await firstValueFrom(asked.afterClosed());
    if (sure === true) await this.drafts.remove(draft.id);
  }
}

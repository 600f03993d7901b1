import { ChangeDetectionStrategy, Component, computed, inject, input, output } from '@angular/core';
import { isLeftDangerous } from '#shared/domain/danger';
import { Drafts } from '../../../core/drafts/drafts';
import { DangerSign } from '../../../ui/danger-sign/danger-sign';
import { ACTION_NAMES, CONDITION_NAMES, SIDE_NAMES, ZONE_NAMES } from '../../../ui/words';
import { removeFinding } from '../findings-edit';
import { OpenDraft } from '../open-draft';

/** The findings set so far, numbered as on the map, each to be opened again or taken off. */
@Component({
  selector: 'us-finding-rows',
  imports: [DangerSign],
  templateUrl: './finding-rows.html',
  styleUrl: './finding-rows.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FindingRows {
  /** The one being written. */
  readonly open = input.required<string | undefined>();
  readonly opened = output<string | undefined>();

  private readonly draft = inject(OpenDraft);
  private readonly drafts = inject(Drafts);
  protected readonly rows = computed(() =>
    (this.draft.document().findings ?? []).map((one, index) => ({
      ref: one.ref,
      number: index + 1,
      place: [one.zone && ZONE_NAMES[one.zone], one.side && SIDE_NAMES[one.side]]
        .filter(Boolean)
        .join(', '),
      words: [
        one.seenAs && `seen as ${CONDITION_NAMES[one.seenAs]}`,
        one.workedAs && `worked as ${CONDITION_NAMES[one.workedAs]}`,
        one.action ? ACTION_NAMES[one.action] : 'not decided yet',
      ]
        .filter(Boolean)
        .join(', '),
      photos: this.draft.photos().filter(({ finding }) => finding === one.ref).length,
      dangerous:
        one.seenAs !== undefined &&
        isLeftDangerous({ ...one, seenAs: one.seenAs, structural: one.structural ?? false }),
    })),
  );

  protected async remove(ref: string): Promise<void> {
    const id = this.draft.id();
    const photos = this.draft.photos().filter(({ finding }) => finding === ref);
    this.draft.rewrite((document) => removeFinding(document, ref));
    if (this.open() === ref) this.opened.emit(undefined);
    if (id === undefined) return;
    for (const photo of photos) await this.drafts.removePhoto(id, photo.id);
  }
}

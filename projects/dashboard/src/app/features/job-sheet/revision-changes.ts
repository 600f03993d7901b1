import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import { getJobChanges } from '#shared/contracts/corrections';
import type { JobSheet } from '#shared/contracts/jobs';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { changeRows } from '../../ui/changes/change-rows';
import { ChangeTable } from '../../ui/changes/change-table';
import { placeWords } from '../../ui/changes/field-words';
import { namesKnown } from '../../ui/changes/known-names';
import { formatCounted } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import type { RevisionPair } from './revision-pair';
import { revisionWords } from './revision-columns';

/** What changed between two revisions of a job, and the choice of any two. */
@Component({
  selector: 'us-revision-changes',
  imports: [ChangeTable, LoadState],
  templateUrl: './revision-changes.html',
  styleUrl: './revision-changes.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RevisionChanges {
  private readonly catalogue = inject(Catalogue);
  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');

  readonly job = input.required<JobSheet>();
  readonly pair = input.required<RevisionPair>();
  /** Two others are to be compared; `undefined`: none any more. */
  readonly compare = output<RevisionPair | undefined>();

  protected readonly answer = inject(Api).read(getJobChanges, () => ({
    params: { branch: this.job().branch, jobRef: this.job().jobRef },
    query: this.pair(),
  }));
  protected readonly rows = computed(() => {
    const findings = this.job().findings ?? [];
    const places = new Map(findings.map(({ ref, zone, side }) => [ref, placeWords(zone, side)]));
    return changeRows(
      this.answer.value()?.changes ?? [],
      namesKnown(this.catalogue, (ref) => places.get(ref)),
    );
  });
  protected readonly title = computed(
    () => `What changed from revision ${this.pair().from} to ${this.pair().to}`,
  );
  protected readonly marks = computed(() => {
    const to = this.answer.value()?.to;
    const fields = formatCounted(this.rows().length, 'field', 'fields');
    return to ? `${fields}. ${revisionWords(to)}` : '';
  });
  protected readonly revisions = computed(() =>
    this.job()
      .revisions.map(({ revision }) => revision)
      .sort((a, b) => a - b),
  );

  constructor() {
    // Opened from the table above or from a link: what was asked for is brought into view.
    let shown = '';
    afterRenderEffect(() => {
      const title = this.title();
      if (!this.answer.value() || shown === title) return;
      shown = title;
      this.heading().nativeElement.focus();
    });
  }

  protected choose(end: 'from' | 'to', chosen: string): void {
    const pair = { ...this.pair(), [end]: Number(chosen) };
    this.compare.emit({ from: Math.min(pair.from, pair.to), to: Math.max(pair.from, pair.to) });
  }
}

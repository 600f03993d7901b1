import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { getClaimHistory } from '#shared/contracts/claim-list';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { changeRows } from '../../ui/changes/change-rows';
import { ChangeTable } from '../../ui/changes/change-table';
import { namesKnown } from '../../ui/changes/known-names';
import { LoadState } from '../../ui/load-state/load-state';
import { claimRevisionWords } from './revision-words';

/** Who changed what of a claim, and when: every revision, the newest first. */
@Component({
  selector: 'us-claim-history',
  imports: [ChangeTable, LoadState],
  template: `
    <us-load-state [of]="history" shape="rows">
      <ol>
        @for (one of revisions(); track one.revision) {
          <li>
            <p class="words">{{ one.words }}</p>
            @if (one.rows.length > 0) {
              <us-change-table [label]="one.label" [rows]="one.rows" />
            } @else if (!one.first) {
              <p class="us-small us-quiet">Nothing that you may see: only its money changed.</p>
            }
          </li>
        }
      </ol>
    </us-load-state>
  `,
  styles: `
    ol {
      list-style: none;
    }
    li {
      padding: 10px 0;
      border-bottom: 1px solid var(--us-hairline);
    }
    li:last-child {
      border-bottom: 0;
    }
    .words {
      font-weight: 500;
      font-size: 14px;
      line-height: 20px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ClaimHistory {
  private readonly catalogue = inject(Catalogue);
  readonly branch = input.required<string>();
  readonly claimRef = input.required<string>();
  protected readonly history = inject(Api).read(getClaimHistory, () => ({
    params: { branch: this.branch(), claimRef: this.claimRef() },
  }));
  protected readonly revisions = computed(() =>
    (this.history.value()?.items ?? []).map((item) => ({
      revision: item.revision,
      first: item.change === 'created',
      words: claimRevisionWords(item),
      label: `What revision ${item.revision} changed`,
      rows: changeRows(item.changes, namesKnown(this.catalogue)),
    })),
  );

  /** Reads it again, after something was changed here. */
  reload(): void {
    this.history.reload();
  }
}

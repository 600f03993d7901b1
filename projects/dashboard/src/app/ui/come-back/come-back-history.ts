import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { getComeBack } from '#shared/contracts/come-back';
import { Api } from '../../core/api/api';
import { LoadState } from '../load-state/load-state';
import { type Markable, markWords } from './come-back-words';

/** Every mark that was set on a finding, the newest first. */
@Component({
  selector: 'us-come-back-history',
  imports: [LoadState],
  template: `
    <h3>Marks so far</h3>
    <us-load-state [of]="finding" shape="rows">
      <ol>
        @for (change of changes(); track $index) {
          <li>
            {{ change.words }}
            @if (change.note) {
              <span class="note">{{ change.note }}</span>
            }
          </li>
        } @empty {
          <li class="us-quiet">None yet: it stands as the job left it.</li>
        }
      </ol>
    </us-load-state>
  `,
  styles: `
    :host {
      display: block;
      padding: 4px 0 16px;
      font-size: 14px;
      line-height: 20px;
    }
    h3 {
      font-size: 14px;
      line-height: 20px;
    }
    ol {
      list-style: none;
    }
    li {
      padding: 5px 0;
      border-bottom: 1px solid var(--us-hairline);
      overflow-wrap: anywhere;
    }
    li:last-child {
      border-bottom: 0;
    }
    .note {
      display: block;
      color: var(--us-quiet);
      white-space: pre-line;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ComeBackHistory {
  readonly of = input.required<Markable>();

  protected readonly finding = inject(Api).read(getComeBack, () => {
    const { branch, jobRef, ref } = this.of();
    return { params: { branch, jobRef, ref } };
  });
  protected readonly changes = computed(() =>
    [...(this.finding.value()?.changes ?? [])]
      .reverse()
      .map((change) => ({ words: markWords(change), note: change.note })),
  );
}

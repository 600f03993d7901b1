import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { UndersideMarks } from '../../../underside-map/underside-marks';
import { onMap } from '../findings-edit';
import { OpenDraft } from '../open-draft';

/** On a wide window, beside the fields: the car from below with what was found on it. */
@Component({
  selector: 'us-draft-aside',
  imports: [UndersideMarks],
  template: `
    <aside aria-label="Found so far">
      <h2>Found so far</h2>
      @if (findings().length === 0) {
        <p class="us-small us-quiet">No rust set yet.</p>
      }
      <us-underside-marks [findings]="findings()" />
    </aside>
  `,
  styles: `
    aside {
      position: sticky;
      top: 16px;
    }
    h2 {
      margin-bottom: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DraftAside {
  private readonly draft = inject(OpenDraft);
  protected readonly findings = computed(() => onMap(this.draft.document().findings ?? []));
}

import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { CurveGroup, WarrantyAnswer } from '#shared/contracts/warranty';
import { ScopePart } from '../../core/scope-line/scope-part';
import { formatCars, formatCount, formatList } from '../../ui/format';
import { GROUP_WORDS, usefulGroupings } from './curves-picture';
import { GroupingPanel } from './grouping-panel';
import { GroupsPanel } from './groups-panel';
import { groupName, type WarrantyWords } from './warranty-words';

/** What the curves are told apart by, in words that are controls. */
@Component({
  selector: 'us-curve-choice',
  imports: [GroupingPanel, GroupsPanel, ScopePart],
  template: `
    <span class="us-small us-quiet">Told apart by</span>
    <us-scope-part label="Curves told apart by" [words]="by()" #grouping>
      <ng-template>
        <us-grouping-panel
          [groupings]="groupings()"
          [chosen]="answer().groupBy"
          (show)="grouping.close(); grouped.emit($event)"
        />
      </ng-template>
    </us-scope-part>
    @if (answer().everyGroup.length > 1) {
      <span class="us-quiet" aria-hidden="true">·</span>
      <us-scope-part label="Curves shown" [words]="shown()" #groups>
        <ng-template>
          <us-groups-panel
            [groups]="every()"
            [chosen]="keys()"
            (show)="groups.close(); chosen.emit($event)"
          />
        </ng-template>
      </us-scope-part>
    }
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      align-items: baseline;
      gap: 6px 10px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class CurveChoice {
  readonly answer = input.required<WarrantyAnswer>();
  readonly words = input.required<WarrantyWords>();
  readonly grouped = output<CurveGroup>();
  readonly chosen = output<string[]>();

  protected readonly by = computed(() => GROUP_WORDS[this.answer().groupBy]);
  protected readonly groupings = computed(() => usefulGroupings(this.answer()));
  protected readonly keys = computed(() => this.answer().groups.map(({ key }) => key));
  protected readonly every = computed(() =>
    this.answer().everyGroup.map(({ key, cars }) => ({
      key,
      name: this.name(key),
      cars: formatCars(cars),
    })),
  );
  protected readonly shown = computed(() => {
    const keys = this.keys();
    const all = this.answer().everyGroup.length;
    if (keys.length === all) return all === 2 ? 'both' : `all ${formatCount(all)}`;
    return formatList(keys.map((key) => this.name(key)));
  });

  private name(key: string): string {
    return groupName(this.answer().groupBy, key, this.words());
  }
}

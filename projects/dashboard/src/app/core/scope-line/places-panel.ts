import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { placesOf, type RegionBranches, tickedBranches } from './places';

/** Above so many branches a search field stands over the list. */
const SEARCH_FROM = 9;

/** Chooses branches, singly or by region. Nothing is applied before "Show". */
@Component({
  selector: 'us-places-panel',
  imports: [MatButton, MatCheckbox],
  templateUrl: './places-panel.html',
  styleUrl: './panel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PlacesPanel {
  readonly regions = input.required<readonly RegionBranches[]>();
  readonly chosen = input.required<{
    readonly regions: readonly string[];
    readonly branches: readonly string[];
  }>();
  /** Words for all branches: "Whole network". */
  readonly all = input.required<string>();
  readonly show = output<{ regions: string[]; branches: string[] }>();

  protected readonly ticked = linkedSignal(() => tickedBranches(this.regions(), this.chosen()));
  protected readonly search = signal('');
  protected readonly searchable = computed(
    () => this.regions().flatMap((region) => region.branches).length >= SEARCH_FROM,
  );
  protected readonly listed = computed(() => {
    const wanted = this.search().trim().toLocaleLowerCase();
    return this.regions()
      .map((region) => ({
        ...region,
        count: region.branches.filter((branch) => this.ticked().has(branch.code)).length,
        total: region.branches.length,
        branches: region.branches.filter((branch) =>
          `${branch.name} ${branch.code} ${region.name}`.toLocaleLowerCase().includes(wanted),
        ),
      }))
      .filter((region) => region.branches.length > 0);
  });

  protected tick(codes: readonly string[], on: boolean): void {
    const next = new Set(this.ticked());
    for (const code of codes) {
      if (on) next.add(code);
      else next.delete(code);
    }
    this.ticked.set(next);
  }

  protected tickRegion(code: string, on: boolean): void {
    const region = this.regions().find((one) => one.code === code);
    this.tick(region?.branches.map((branch) => branch.code) ?? [], on);
  }

  protected apply(): void {
    this.show.emit(placesOf(this.regions(), this.ticked()));
  }

  protected clear(): void {
    this.show.emit({ regions: [], branches: [] });
  }
}

import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatCount } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { corrosivityWords } from '../../ui/set-up/corrosivity-words';
import { Corrosivity } from '../../ui/set-up/corrosivity';
import { type Region, regionChange } from '../../ui/set-up/region-changes';
import { typedClimate } from './typed-climate';
import { WhoChanged } from './who-changed';

/** The regions, each with its air, and the way to a new one. */
@Component({
  selector: 'us-regions-page',
  imports: [ChangeForm, Corrosivity, DataTable, LoadState, WhoChanged],
  templateUrl: './regions-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RegionsPage {
  private readonly api = inject(Api);
  protected readonly catalogue = inject(Catalogue);
  protected readonly typed = typedClimate();
  protected readonly columns = computed((): Column<Region>[] => [
    {
      key: 'name',
      label: 'Region',
      text: ({ name }) => name,
      quiet: ({ code }) => code,
      link: ({ code }) => ({ commands: ['/set-up/regions', code] }),
    },
    {
      key: 'branches',
      label: 'Branches',
      kind: 'number',
      text: ({ code }) =>
        formatCount(this.catalogue.branches().filter(({ region }) => region === code).length),
    },
    { key: 'air', label: 'Corrosivity', text: airOf, muted: ({ climate }) => climate === null },
  ]);
  protected readonly form = computed(() =>
    regionChange(
      this.api,
      this.catalogue.regions().map(({ code }) => code),
    ),
  );
}

function airOf({ climate }: Region): string {
  if (!climate) return 'no climate yet';
  const { rate, category } = corrosivityWords(climate);
  return `${rate}, ${category}`;
}

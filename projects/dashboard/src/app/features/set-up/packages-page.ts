import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { Router } from '@angular/router';
import { BODY_TYPES } from '#shared/domain/vocabulary';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { Column } from '../../ui/data-table/column';
import { DataTable } from '../../ui/data-table/data-table';
import { formatCount } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { ChangeForm } from '../../ui/set-up/change-form';
import { type Package, packageChange } from '../../ui/set-up/package-changes';
import { WhoChanged } from './who-changed';

/** The packages sold, and the way to a new one. */
@Component({
  selector: 'us-packages-page',
  imports: [ChangeForm, DataTable, LoadState, WhoChanged],
  templateUrl: './packages-page.html',
  styleUrl: './part.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PackagesPage {
  private readonly api = inject(Api);
  private readonly router = inject(Router);
  protected readonly catalogue = inject(Catalogue);
  protected readonly columns = computed((): Column<Package>[] => [
    {
      key: 'name',
      label: 'Package',
      text: ({ name }) => name,
      quiet: ({ code }) => code,
      link: ({ code }) => ({ commands: ['/set-up/packages', code] }),
    },
    {
      key: 'warranty',
      label: 'Warranty, months',
      kind: 'number',
      text: ({ warrantyMonths }) => (warrantyMonths === 0 ? 'none' : formatCount(warrantyMonths)),
    },
    {
      key: 'norms',
      label: 'Norms',
      text: ({ code }) => {
        const norms = this.catalogue.value()?.norms ?? [];
        const bodies = norms.filter((norm) => norm.package === code && norm.norms.length > 0);
        return `${bodies.length} of ${BODY_TYPES.length} body types`;
      },
    },
  ]);
  protected readonly form = computed(() =>
    packageChange(
      this.api,
      this.catalogue.packages().map(({ code }) => code),
    ),
  );

  /** On to the new package's own page, where its norms are. */
  protected async added({ code }: Package): Promise<void> {
    this.catalogue.state.reload();
    await this.router.navigate(['/set-up/packages', code]);
  }
}

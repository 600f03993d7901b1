import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { Router, RouterLink } from '@angular/router';
import { Catalogue } from '../../core/catalogue/catalogue';
import { EmptyNext } from '../../ui/empty-next/empty-next';
import { branchOf } from './branch-of';
import { EarlierFiles } from './earlier-files';
import { FileStanding } from './file-standing';
import { SendFile } from './send-file';

/** Brings in jobs or claims from a CSV: a file is sent, looked at, and only then written. The URL says whose and which. */
@Component({
  selector: 'us-import-page',
  imports: [EarlierFiles, EmptyNext, FileStanding, RouterLink, SendFile],
  templateUrl: './import-page.html',
  styleUrl: './import-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ImportPage {
  private readonly router = inject(Router);
  private readonly catalogue = inject(Catalogue);

  // From the URL.
  readonly branch = input<string | readonly string[]>();
  readonly file = input<string>();

  protected readonly known = this.catalogue.value;
  protected readonly branches = this.catalogue.branches;
  protected readonly chosen = computed(() => branchOf(this.branch(), this.branches()));
  protected readonly chosenName = computed(() => {
    const branch = this.chosen();
    return branch && this.catalogue.branchName(branch);
  });

  protected choose(branch: string): void {
    void this.router.navigate([], { queryParams: { branch }, replaceUrl: true });
  }

  protected open(file: string): void {
    void this.router.navigate([], { queryParams: { branch: this.chosen(), file } });
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DOCUMENT,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { NgTemplateOutlet } from '@angular/common';
import { MatButton } from '@angular/material/button';
import { MatDialog } from '@angular/material/dialog';
import { Router, RouterLink } from '@angular/router';
import { firstValueFrom } from 'rxjs';
import { getJob } from '#shared/contracts/jobs';
import { BridgeChart } from '../../charts/bridge/bridge-chart';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { StoredPhotos } from '../../core/photos/stored-photos';
import { Session } from '../../core/session/session';
import { Answer } from '../../ui/answer/answer';
import { Caution } from '../../ui/caution/caution';
import { CellTemplate } from '../../ui/data-table/cell-template';
import { DataTable } from '../../ui/data-table/data-table';
import { type Fact, FactList } from '../../ui/fact-list/fact-list';
import {
  currencySign,
  formatCount,
  formatDate,
  formatExactMoney,
  formatMinutes,
} from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';
import { narrowWindow } from '../../ui/narrow';
import { JobPhotos } from '../../ui/photos/job-photos';
import { TableTwin } from '../../ui/table-twin/table-twin';
import { CONSUMABLE_NAMES } from '../../ui/words';
import { UndersideMarks } from '../../underside-map/underside-marks';
import { BRIDGE_COLUMNS, bridgeSeries } from './bridge-series';
import { cautionsOf } from './cautions';
import { billFacts, carFacts, checkFacts, dateFacts, workshopFacts } from './facts';
import { FindingsList } from './findings-list';
import { JobClaims } from './job-claims';
import { missingCostWords } from './missing-cost-words';
import { moneyLines } from './money-lines';
import { productColumns, productRows } from './product-rows';
import { RevisionChanges } from './revision-changes';
import { REVISION_COLUMNS } from './revision-columns';
import { pairToUrl, type RevisionPair, revisionPair } from './revision-pair';
import { sheetSentence } from './sheet-sentence';
import { stageColumns, stageRows } from './stage-rows';
import { UndoVoid } from './undo-void';
import { VoidDialog, type VoidDialogData } from './void-dialog';

/** Everything recorded of one job. */
@Component({
  selector: 'us-job-sheet-page',
  imports: [
    Answer,
    BridgeChart,
    Caution,
    CellTemplate,
    DataTable,
    FactList,
    FindingsList,
    JobClaims,
    JobPhotos,
    LoadState,
    MatButton,
    NgTemplateOutlet,
    RevisionChanges,
    RouterLink,
    TableTwin,
    UndersideMarks,
    UndoVoid,
  ],
  templateUrl: './job-sheet-page.html',
  styleUrl: './job-sheet-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class JobSheetPage {
  private readonly catalogue = inject(Catalogue);
  private readonly dialog = inject(MatDialog);
  private readonly router = inject(Router);
  private readonly window = inject(DOCUMENT).defaultView;
  private readonly role = inject(Session).role;
  private readonly narrow = narrowWindow();

  // From the path.
  readonly branch = input.required<string>();
  readonly jobRef = input.required<string>();
  /** Two revisions to compare, from the query: `2-4`. */
  readonly changes = input<string>();

  protected readonly job = inject(Api).read(getJob, () => ({
    params: { branch: this.branch(), jobRef: this.jobRef() },
  }));

  protected readonly photographed = computed(() => ({
    branch: this.branch(),
    jobRef: this.jobRef(),
  }));
  private readonly stored = inject(StoredPhotos).list(this.photographed);
  protected readonly photos = computed(() => this.stored.value()?.items ?? []);
  /** Those that no finding on the sheet shows. */
  protected readonly carPhotos = computed(() => {
    const found = new Set((this.job.value()?.findings ?? []).map(({ ref }) => ref));
    return this.photos().filter(({ finding }) => finding === null || !found.has(finding));
  });
  protected readonly mayVoid = computed(
    () => this.role() === 'site_manager' || this.role() === 'head_office',
  );
  protected readonly mayCorrect = computed(() => this.mayVoid() || this.role() === 'recorder');
  protected readonly headOffice = computed(() => this.role() === 'head_office');
  protected readonly subject = computed(() => `/branches/${this.branch()}/jobs/${this.jobRef()}`);
  /** The job stands void by what was done here: in place of its sheet stands the way back. */
  protected readonly voided = linkedSignal({ source: this.subject, computation: () => false });
  /** What was done here last, for those who see and those who hear it. */
  protected readonly said = linkedSignal({ source: this.subject, computation: () => '' });
  protected readonly pair = computed(() =>
    revisionPair(this.changes(), this.job.value()?.revision ?? 0),
  );
  protected readonly sign = computed(() => currencySign(this.catalogue.currency()));
  protected readonly currency = this.catalogue.currency;
  protected readonly today = computed(() => this.catalogue.today() ?? '');
  protected readonly sheet = computed(() => {
    const job = this.job.value();
    if (!job) return undefined;
    const packageName = this.catalogue.packageName(job.package);
    return {
      ...job,
      ...sheetSentence(job, {
        currency: this.currency(),
        packageName,
        branchName: this.catalogue.branchName(job.branch),
      }),
      cautions: cautionsOf(job),
      car: carFacts(job),
      dates: dateFacts(job, packageName),
      bill: billFacts(job, this.currency()),
      checked: checkFacts(job),
      air: workshopFacts(job),
      stages: stageRows(job),
      stageColumns: stageColumns(job, this.narrow() ? 'left out' : 'drawn'),
      productRows: productRows(
        job.products,
        this.catalogue.normsOf(job.package, job.vehicle.bodyType),
      ),
      lines: job.money ? moneyLines(job.money) : [],
      bridge: job.money?.bridge ? bridgeSeries(job.money.bridge) : undefined,
      missing: (job.missingCosts ?? []).map((cost) =>
        missingCostWords(cost, {
          branchName: (code) => this.catalogue.branchName(code),
          productName: (code) => this.catalogue.productName(code),
        }),
      ),
    };
  });
  protected readonly productColumns = productColumns((code) => this.catalogue.productName(code));
  protected readonly revisionColumns = REVISION_COLUMNS;
  protected readonly bridgeColumns = BRIDGE_COLUMNS;
  protected readonly consumables = computed<readonly Fact[]>(() =>
    (this.job.value()?.consumables ?? []).map((one) => ({
      name: CONSUMABLE_NAMES[one.kind],
      text:
        one.unitCostCents === undefined
          ? formatCount(one.quantity)
          : `${formatCount(one.quantity)} at ${formatExactMoney(one.unitCostCents, this.currency())}`,
    })),
  );
  protected readonly extras = computed<readonly Fact[]>(() =>
    (this.job.value()?.agreedExtras ?? []).map((extra) => ({
      name: [formatDate(extra.on), extra.note].filter((part) => part).join(': '),
      text: [
        formatMinutes(extra.minutes),
        ...(extra.priceCents === undefined
          ? []
          : [formatExactMoney(extra.priceCents, this.currency())]),
      ].join(', '),
    })),
  );

  protected print(): void {
    this.window?.print();
  }

  protected async askToVoid(): Promise<void> {
    const data: VoidDialogData = {
      branch: this.branch(),
      jobRef: this.jobRef(),
      etag: this.job.etag(),
    };
    const dialog = this.dialog.open<VoidDialog, VoidDialogData, boolean>(VoidDialog, { data });
    if (await firstValueFrom(dialog.afterClosed())) this.voided.set(true);
  }

  protected restored(): void {
    this.voided.set(false);
    this.said.set(`Job ${this.jobRef()} is back, as it was and in every figure.`);
    this.job.reload();
  }

  /** Puts two revisions into the URL, which can be shared; the page stays where it is. */
  protected compare(pair: RevisionPair | undefined): void {
    void this.router.navigate([], {
      queryParams: { changes: pair ? pairToUrl(pair) : null },
      queryParamsHandling: 'merge',
      scroll: 'manual',
    });
  }
}

import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  inject,
  input,
  output,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { restoreJob } from '#shared/contracts/corrections';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Trouble } from '../../ui/trouble/trouble';

/** Says that a job was voided just now and takes it back at one press. */
@Component({
  selector: 'us-undo-void',
  imports: [MatButton, RouterLink, Trouble],
  template: `
    <h1 class="us-page-title" #heading tabindex="-1">Job {{ jobRef() }} is voided.</h1>
    <p>
      It has left every figure and stays in the record. It can be brought back as it was, now or
      later from <a routerLink="/voided" [queryParams]="{ branch: branch() }">Voided jobs</a>.
    </p>
    <div role="alert">
      @if (restoring.problem(); as problem) {
        <us-trouble>{{ problem.sentence }}</us-trouble>
      }
    </div>
    <p class="acts">
      <button matButton="filled" type="button" [disabled]="restoring.busy()" (click)="bringBack()">
        Bring it back
      </button>
      <a routerLink="/jobs">To the jobs</a>
    </p>
  `,
  styles: `
    :host {
      display: block;
      padding-top: 12px;
    }
    .acts {
      display: flex;
      flex-wrap: wrap;
      align-items: center;
      gap: 12px 24px;
      margin-top: 16px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class UndoVoid {
  private readonly api = inject(Api);
  private readonly heading = viewChild.required<ElementRef<HTMLElement>>('heading');
  readonly branch = input.required<string>();
  readonly jobRef = input.required<string>();
  /** The job stands in every figure again. */
  readonly restored = output();

  protected readonly restoring = deed(() =>
    this.api.call(restoreJob, { params: { branch: this.branch(), jobRef: this.jobRef() } }),
  );

  constructor() {
    // The button that was pressed is gone with the sheet: what happened takes the focus.
    afterNextRender(() => this.heading().nativeElement.focus());
  }

  protected async bringBack(): Promise<void> {
    if (await this.restoring.run(undefined)) this.restored.emit();
  }
}

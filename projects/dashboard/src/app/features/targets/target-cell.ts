import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  ElementRef,
  inject,
  Injector,
  input,
  output,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { Observable } from 'rxjs';
import { putBranchTarget, putNetworkTarget } from '#shared/contracts/targets';
import type { TargetMeasure } from '#shared/domain/target-measures';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { fieldMessage } from '../../core/api/problem';
import { KeptText } from '../../ui/kept-text';
import { measureOfTyped, measureToType } from '../../ui/measure-words';
import { Trouble } from '../../ui/trouble/trouble';
import type { TargetCellView } from './target-rows';

/** What is typed, with its unit. */
const FIELD_LABELS: Readonly<Record<TargetMeasure, string>> = {
  overrun: '% over the estimate',
  claims: 'per 1,000 car-years',
  product: '% of norm',
  margin: '% of what is billed',
};
const HOW: Readonly<Record<TargetMeasure, string>> = {
  overrun: 'Write it as 10 or 7.5; 0 is exactly as estimated.',
  claims: 'Write it as 18 or 17.5, 0 to 1,000.',
  product: 'Write it as 100 or 97.5.',
  margin: 'Write it as 35 or 35.5, 0 to 100.',
};

/** One target in the table: read, or typed where it stands. What is typed stays until it is taken. */
@Component({
  selector: 'us-target-cell',
  imports: [MatButton, MatFormFieldModule, MatInput, Trouble],
  templateUrl: './target-cell.html',
  styleUrl: './target-cell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TargetCell {
  readonly of = input.required<TargetCellView>();
  readonly mayChange = input.required<boolean>();
  readonly changed = output<string>();

  private readonly api = inject(Api);
  private readonly kept = inject(KeptText);
  private readonly injector = inject(Injector);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  /** Text being typed; closed when null. */
  protected readonly text = signal<string | null>(null);
  protected readonly unread = signal(false);
  protected readonly label = computed(() => FIELD_LABELS[this.of().measure]);
  protected readonly saving = deed(
    ({ of, value }: { of: TargetCellView; value: number | null }): Observable<unknown> => {
      const { measure, branch } = of;
      return branch === null
        ? this.api.call(putNetworkTarget, { params: { measure }, body: { value } })
        : this.api.call(putBranchTarget, { params: { branch, measure }, body: { value } });
    },
  );

  protected open(): void {
    const { own, measure } = this.of();
    this.text.set(
      this.kept.read(this.keepAs()) ?? (own === null ? '' : measureToType(measure, own)),
    );
    this.focus('input');
  }

  protected type(text: string): void {
    this.text.set(text);
    this.unread.set(false);
    this.kept.keep(this.keepAs(), text);
  }

  protected wrong(): string | undefined {
    if (this.unread()) return HOW[this.of().measure];
    return fieldMessage(this.saving.problem(), '/value');
  }

  protected leave(): void {
    this.kept.forget(this.keepAs());
    this.saving.clear();
    this.unread.set(false);
    this.text.set(null);
    this.focus('button');
  }

  protected async save(): Promise<void> {
    const value = measureOfTyped(this.of().measure, this.text() ?? '');
    this.unread.set(value === undefined);
    if (value === undefined) this.focus('input');
    else await this.put(value);
  }

  protected async put(value: number | null): Promise<void> {
    const of = this.of();
    if (!(await this.saving.run({ of, value }))) return;
    this.leave();
    this.changed.emit(value === null ? `${of.name}: taken away.` : `${of.name}: set.`);
  }

  private keepAs(): string {
    return `target.${this.of().key}`;
  }

  private focus(name: 'input' | 'button'): void {
    afterNextRender(() => this.host.querySelector<HTMLElement>(name)?.focus(), {
      injector: this.injector,
    });
  }
}

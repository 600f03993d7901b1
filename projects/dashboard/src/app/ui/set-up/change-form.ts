import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  signal,
  untracked,
  viewChild,
} from '@angular/core';
import { outputFromObservable, toSignal } from '@angular/core/rxjs-interop';
import { FormControl, FormRecord, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { debounceTime, map } from 'rxjs';
import { Catalogue } from '../../core/catalogue/catalogue';
import { deed } from '../../core/api/deed';
import { Trouble } from '../trouble/trouble';
import type { ChangeOf } from './change-of';
import { EffectTold } from './effect';
import { restatedWords } from './effect-words';
import type { Field, Typed } from './field';
import { codesOf, wrongIn } from './read-field';

/** Milliseconds of rest after which what is typed is taken as meant, so that not every key asks for its effect. */
const REST = 400;

/** One change of set-up as a form: what it moves is said before it is saved, what was typed stays until it is taken. */
@Component({
  selector: 'us-change-form',
  imports: [
    EffectTold,
    MatButton,
    MatCheckbox,
    MatFormFieldModule,
    MatInput,
    ReactiveFormsModule,
    Trouble,
  ],
  templateUrl: './change-form.html',
  styleUrl: './change-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ChangeForm<Out> {
  readonly of = input.required<ChangeOf<Out>>();
  readonly leaving = input<'offered' | 'none'>('none');
  readonly saved = output<Out>();
  readonly leave = output();

  private readonly effectTold = viewChild(EffectTold);
  protected readonly form = new FormRecord<FormControl<string>>({});
  /** What stands in the fields, for what is worked out beside them. */
  readonly typing = outputFromObservable(this.form.valueChanges.pipe(map(whole)));
  protected readonly currency = inject(Catalogue).currency;
  private readonly typed = toSignal(this.form.valueChanges, { initialValue: {} });
  private readonly rested = toSignal(this.form.valueChanges.pipe(debounceTime(REST)), {
    initialValue: {},
  });
  private readonly done = signal<string | undefined>(undefined);
  /** What stood in the fields when they were sent before their effect was told. */
  private readonly sentEarly = signal('');
  private readonly hurried = computed(() => this.sentEarly() === JSON.stringify(this.typed()));
  /** Counts what was taken: a saved change is no longer a planned one. */
  private readonly taken = signal(0);
  /** Refusals that belong to no field that is shown. */
  protected readonly elsewhere = signal('');
  protected readonly saving = deed((typed: Typed) => this.of().save(typed));
  protected readonly shown = computed(() =>
    this.of().fields.filter((field) => field.shownIf?.(whole(this.typed())) ?? true),
  );
  protected readonly planned = computed(() => {
    const typed = whole(this.rested());
    this.taken();
    if (
      Object.keys(this.wrongIn(typed)).length > 0 ||
      this.form.pristine ||
      Object.keys(typed).length === 0
    )
      return undefined;
    return this.of().change?.(typed);
  });
  /** Something is typed that is not saved. */
  readonly unsaved = computed(() => {
    this.typed();
    this.taken();
    return this.form.dirty;
  });
  protected readonly standing = computed(() => {
    if (this.saving.busy()) {
      return this.of().change
        ? 'Saving. Figures switch all at once when they are computed.'
        : 'Saving.';
    }
    if (!this.hurried()) return this.done() ?? '';
    return this.planned() && this.effectTold()?.said()
      ? 'See what it moves, then press once more.'
      : 'Counting what it moves first.';
  });

  constructor() {
    // Controls are kept by name: a field that goes out of sight keeps what was typed in it.
    effect(() => {
      const { start, fields } = this.of();
      untracked(() => {
        for (const { key } of fields) {
          const control = this.form.controls[key];
          if (!control)
            this.form.addControl(key, new FormControl(start[key] ?? '', { nonNullable: true }));
          else if (control.pristine) control.setValue(start[key] ?? '');
        }
      });
    });
    effect(() => {
      this.typed();
      untracked(() => {
        if (this.form.dirty) this.done.set(undefined);
      });
    });
  }

  protected async submit(): Promise<void> {
    this.writeCodes();
    const typed = this.form.getRawValue();
    this.form.markAllAsTouched();
    const wrong = this.wrongIn(typed);
    for (const [key, message] of Object.entries(wrong)) {
      this.form.controls[key]?.setErrors({ server: message });
    }
    if (Object.keys(wrong).length > 0) return;
    if (this.mustWait(typed)) {
      this.sentEarly.set(JSON.stringify(typed));
      return;
    }
    this.sentEarly.set('');
    const answer = await this.saving.run(typed);
    if (!answer) {
      this.markRefused();
      return;
    }
    this.form.markAsPristine();
    this.taken.update((times) => times + 1);
    if (this.of().after === 'clear') this.form.reset(this.of().start);
    this.done.set(restatedWords(restatedIn(answer.body)));
    this.saved.emit(answer.body);
  }

  protected messageOf({ key }: Field): string | undefined {
    const control = this.form.controls[key];
    return control?.touched ? (control.getError('server') as string | undefined) : undefined;
  }

  protected isTicked(key: string, value: string): boolean {
    return codesOf(whole(this.typed()), key).includes(value);
  }

  protected tick(key: string, value: string): void {
    const codes = codesOf(this.form.getRawValue(), key);
    const next = codes.includes(value) ? codes.filter((code) => code !== value) : [...codes, value];
    this.take(key, next.join(' '));
  }

  protected take(key: string, value: string): void {
    const control = this.form.controls[key];
    // As a key does: whoever hears of the value finds it changed already.
    control?.markAsDirty();
    control?.setValue(value);
  }

  protected typeOf({ kind }: Field): string {
    if (kind === 'newPassword') return 'password';
    return kind === 'date' || kind === 'email' ? kind : 'text';
  }

  protected modeOf({ kind }: Field): string | null {
    if (kind === 'whole') return 'numeric';
    return kind === 'money' || kind === 'percent' ? 'decimal' : null;
  }

  /** Codes have one case: nobody is refused for the other one. */
  private writeCodes(): void {
    for (const { key, kind } of this.of().fields) {
      if (kind !== 'code' && kind !== 'packageCode') continue;
      const control = this.form.controls[key];
      const text = control?.value ?? '';
      const written = kind === 'code' ? text.toUpperCase() : text.toLowerCase();
      if (written !== text) control?.setValue(written);
    }
  }

  private wrongIn(typed: Typed): Readonly<Record<string, string>> {
    const { fields, check } = this.of();
    const single = fields.flatMap((field) => {
      const message = wrongIn(field, typed);
      return message ? [[field.key, message] as const] : [];
    });
    return { ...check?.(typed), ...Object.fromEntries(single) };
  }

  /** Each refusal at its field, by the part of its path that names one; the rest below the form. */
  private markRefused(): void {
    const elsewhere: string[] = [];
    for (const { path, message } of this.saving.problem()?.fields ?? []) {
      const key = path.split('/').find((part) => part in this.form.controls);
      const control = key === undefined ? undefined : this.form.controls[key];
      if (!control) elsewhere.push(`${message}.`);
      control?.setErrors({ server: message });
      control?.markAsTouched();
    }
    this.elsewhere.set(elsewhere.join(' '));
  }

  /** Nobody saves what they have not been told the effect of, however fast they are. */
  private mustWait(typed: Typed): boolean {
    const meant = this.of().change?.(typed);
    if (!meant || this.form.pristine) return false;
    const told = this.effectTold();
    return JSON.stringify(meant) !== JSON.stringify(this.planned()) || !told?.said();
  }
}

function whole(typed: Readonly<Record<string, string | undefined>>): Typed {
  return Object.fromEntries(Object.entries(typed).map(([key, text]) => [key, text ?? '']));
}

function restatedIn(body: unknown): number {
  if (typeof body !== 'object' || body === null || !('restatedJobs' in body)) return 0;
  return typeof body.restatedJobs === 'number' ? body.restatedJobs : 0;
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import {
  type AbstractControl,
  NonNullableFormBuilder,
  ReactiveFormsModule,
  type ValidatorFn,
  Validators,
} from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { isMonth } from '#shared/domain/calendar';
import { BODY_TYPES, type BodyType } from '#shared/domain/vocabulary';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Trouble } from '../../ui/trouble/trouble';
import { BODY_TYPE_NAMES } from '../../ui/words';
import { type KnownMake, modelsFor } from '../../core/catalogue/known-cars';
import { type AskedParts, marginToType, marginTyped, type QuoteQuestion } from './quote-question';

const required: ValidatorFn = (control) =>
  Validators.required(control) ?? (String(control.value).trim() ? null : { required: true });
const month: ValidatorFn = ({ value }: AbstractControl<string>) =>
  isMonth(value) ? null : { month: true };
const margin: ValidatorFn = ({ value }: AbstractControl<string>) =>
  value.trim() === '' || marginTyped(value) !== undefined ? null : { margin: true };

/** The car that is to be quoted. What is typed stays; the question itself lives in the URL. */
@Component({
  selector: 'us-quote-form',
  imports: [MatButton, MatFormFieldModule, MatInput, ReactiveFormsModule, Trouble],
  templateUrl: './quote-form.html',
  styleUrl: './quote-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuoteForm {
  /** What the URL has. */
  readonly asked = input.required<AskedParts>();
  readonly known = input<readonly KnownMake[]>([]);
  /** The package that is quoted most, chosen until another is. */
  readonly usual = input<string>();
  /** Recorders see the price alone and set no margin. */
  readonly money = input.required<'shown' | 'hidden'>();
  readonly ask = output<QuoteQuestion>();

  protected readonly catalogue = inject(Catalogue);
  protected readonly bodyTypes = BODY_TYPES.map((type) => ({ type, name: BODY_TYPE_NAMES[type] }));
  protected readonly form = inject(NonNullableFormBuilder).group({
    make: ['', [required, Validators.maxLength(60)]],
    model: ['', [required, Validators.maxLength(60)]],
    firstRegistered: ['', month],
    bodyType: ['', required],
    package: ['', required],
    branch: ['', required],
    margin: ['', margin],
  });
  private readonly make = toSignal(this.form.controls.make.valueChanges, { initialValue: '' });
  protected readonly models = computed(() => modelsFor(this.known(), this.make()));

  constructor() {
    // The URL fills what nobody has typed over; the only branch and the first package need no choosing.
    effect(() => {
      const asked = this.asked();
      const share = asked.marginShare === undefined ? undefined : Number(asked.marginShare);
      const first = {
        make: asked.make,
        model: asked.model,
        firstRegistered: asked.firstRegistered,
        bodyType: asked.bodyType,
        package: asked.package ?? this.usual() ?? this.catalogue.packages()[0]?.code,
        branch: asked.branch ?? this.catalogue.branches()[0]?.code,
        margin: Number.isFinite(share) ? marginToType(share) : undefined,
      };
      for (const [name, value] of Object.entries(first)) {
        const control = this.form.get(name);
        if (control?.pristine && value !== undefined) control.setValue(value);
      }
    });
  }

  protected submit(): void {
    this.form.markAllAsTouched();
    if (this.form.invalid) return;
    const { margin: typed, make, model, bodyType, ...rest } = this.form.getRawValue();
    const marginShare = this.money() === 'shown' ? marginTyped(typed) : undefined;
    this.form.markAsPristine();
    this.ask.emit({
      ...rest,
      make: make.trim(),
      model: model.trim(),
      bodyType: bodyType as BodyType,
      ...(marginShare === undefined ? {} : { marginShare }),
    });
  }
}

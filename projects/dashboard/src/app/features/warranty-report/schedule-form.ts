import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
  untracked,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { NonNullableFormBuilder, ReactiveFormsModule, type ValidatorFn } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatCheckbox } from '@angular/material/checkbox';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import type { OutOf } from '#shared/contracts/endpoint';
import type { listPeople } from '#shared/contracts/people';
import { putWarrantySchedule, type WarrantySchedule } from '#shared/contracts/warranty-reports';
import { Api } from '../../core/api/api';
import { deed } from '../../core/api/deed';
import { Trouble } from '../../ui/trouble/trouble';
import { peopleToMail } from './people-to-mail';

type Choice = Pick<WarrantySchedule, 'active' | 'dayOfMonth' | 'people'>;

const aDay: ValidatorFn = ({ value }) =>
  dayOf(String(value)) === undefined
    ? { day: 'A day from 1 to 28, so that every month has it.' }
    : null;

/** Sets when the report is issued by itself and who is told. What was typed stays until it is kept. */
@Component({
  selector: 'us-schedule-form',
  imports: [MatButton, MatCheckbox, MatFormFieldModule, MatInput, ReactiveFormsModule, Trouble],
  templateUrl: './schedule-form.html',
  styleUrl: './schedule-form.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ScheduleForm {
  readonly schedule = input.required<WarrantySchedule>();
  readonly people = input.required<OutOf<typeof listPeople>['items']>();
  readonly kept = output<WarrantySchedule>();

  private readonly api = inject(Api);
  protected readonly form = inject(NonNullableFormBuilder).group({
    active: [false],
    dayOfMonth: ['1', aDay],
    people: [[] as readonly number[]],
  });
  private readonly chosen = toSignal(this.form.controls.people.valueChanges, {
    initialValue: [] as readonly number[],
  });
  protected readonly recipients = computed(() =>
    peopleToMail(this.people(), [...this.chosen(), ...this.schedule().people]).map((person) => ({
      ...person,
      ticked: this.chosen().includes(person.id),
    })),
  );
  protected readonly keeping = deed((body: Choice) => this.api.call(putWarrantySchedule, { body }));

  constructor() {
    // A newer schedule fills in what was not touched.
    effect(() => {
      const { active, dayOfMonth, people } = this.schedule();
      untracked(() => {
        const controls = this.form.controls;
        if (controls.active.pristine) controls.active.setValue(active);
        if (controls.dayOfMonth.pristine) controls.dayOfMonth.setValue(String(dayOfMonth));
        if (controls.people.pristine) controls.people.setValue(people);
      });
    });
  }

  protected tick(id: number, on: boolean): void {
    const { people } = this.form.controls;
    const others = people.value.filter((one) => one !== id);
    people.setValue(on ? [...others, id] : others);
    people.markAsDirty();
  }

  protected async keep(): Promise<void> {
    this.form.markAllAsTouched();
    const { active, dayOfMonth: typed, people } = this.form.getRawValue();
    const dayOfMonth = dayOf(typed);
    if (dayOfMonth === undefined) return;
    const answer = await this.keeping.run({ active, dayOfMonth, people: [...people] });
    if (answer) {
      this.form.markAsPristine();
      this.kept.emit(answer.body);
    } else this.markRefused();
  }

  /** Puts each message of a refusal at its field; one person’s stands under all of them. */
  private markRefused(): void {
    for (const { path, message } of this.keeping.problem()?.fields ?? []) {
      const control = path.startsWith('/people')
        ? this.form.controls.people
        : this.form.get(path.slice(1));
      control?.setErrors({ server: message });
      control?.markAsTouched();
    }
  }
}

/** The day of the month that was typed, where every month has it. */
function dayOf(typed: string): number | undefined {
  const day = /^\d{1,2}$/.test(typed.trim()) ? Number(typed) : 0;
  return day >= 1 && day <= 28 ? day : undefined;
}

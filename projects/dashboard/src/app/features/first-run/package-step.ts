import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatFormFieldModule } from '@angular/material/form-field';
import { MatInput } from '@angular/material/input';
import { BODY_TYPES, type BodyType } from '#shared/domain/vocabulary';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { formatList } from '../../ui/format';
import { ChangeForm } from '../../ui/set-up/change-form';
import { NormForms } from '../../ui/set-up/norm-forms';
import { packageChange } from '../../ui/set-up/package-changes';
import { BODY_TYPE_NAMES } from '../../ui/words';
import { KnownNetwork } from './known-network';

/** A package; and, as soon as one is there, its norms for who has them at hand. */
@Component({
  selector: 'us-package-step',
  imports: [ChangeForm, MatFormFieldModule, MatInput, NormForms],
  template: `
    @if (there(); as names) {
      <p class="there">There already: {{ names }}. Another one:</p>
    }
    <us-change-form [of]="form()" (saved)="known.reload()" />
    @if (catalogue.packages()[0]; as sold) {
      <details>
        <summary>Norms of {{ sold.name }}, which can wait</summary>
        <mat-form-field>
          <mat-label>Body type</mat-label>
          <select matNativeControl #body (change)="choose(body.value)">
            @for (one of bodies; track one.type) {
              <option [value]="one.type" [selected]="one.type === bodyType()">
                {{ one.name }}
              </option>
            }
          </select>
        </mat-form-field>
        <us-norm-forms [sold]="sold" [bodyType]="bodyType()" (saved)="known.reload()" />
      </details>
    }
  `,
  styleUrl: './step.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PackageStep {
  private readonly api = inject(Api);
  protected readonly catalogue = inject(Catalogue);
  protected readonly known = inject(KnownNetwork);
  protected readonly bodies = BODY_TYPES.map((type) => ({ type, name: BODY_TYPE_NAMES[type] }));
  protected readonly bodyType = signal<BodyType>('hatchback');
  protected readonly there = computed(() =>
    formatList(this.catalogue.packages().map(({ name }) => name)),
  );
  protected readonly form = computed(() => ({
    ...packageChange(
      this.api,
      this.catalogue.packages().map(({ code }) => code),
    ),
    after: 'clear' as const,
  }));

  protected choose(text: string): void {
    this.bodyType.set(BODY_TYPES.find((type) => type === text) ?? 'hatchback');
  }
}

import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  linkedSignal,
  output,
  viewChildren,
} from '@angular/core';
import type { BodyType } from '#shared/domain/vocabulary';
import { formatList } from '../format';
import { BODY_TYPE_NAMES } from '../words';
import { NormForm } from './norm-form';
import type { Package } from './package-changes';

/** A norm that was looked at. */
interface Opened {
  readonly key: string;
  readonly sold: string;
  readonly bodyType: BodyType;
}

/** The norms of a package, one body type seen at a time: what was typed for another is kept, and told until it is saved. */
@Component({
  selector: 'us-norm-forms',
  imports: [NormForm],
  template: `
    @for (one of opened(); track one.key) {
      <us-norm-form
        [sold]="sold()"
        [bodyType]="one.bodyType"
        [hidden]="one.bodyType !== bodyType()"
        (saved)="saved.emit()"
      />
    }
    <p class="us-small unsaved" role="status">
      @if (unsaved(); as names) {
        Typed and not saved yet: {{ names }}.
      }
    </p>
  `,
  styles: `
    .unsaved {
      margin-top: 8px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NormForms {
  readonly sold = input.required<Package>();
  readonly bodyType = input.required<BodyType>();
  readonly saved = output();

  private readonly forms = viewChildren(NormForm);
  /** Every body type looked at so far keeps its form. */
  protected readonly opened = linkedSignal<Opened, readonly Opened[]>({
    source: () => {
      const sold = this.sold().code;
      const bodyType = this.bodyType();
      return { key: `${sold} ${bodyType}`, sold, bodyType };
    },
    computation: (now, before) => {
      const kept = before?.source.sold === now.sold ? before.value : [];
      return kept.some(({ key }) => key === now.key) ? kept : [...kept, now];
    },
  });
  protected readonly unsaved = computed(() =>
    formatList(
      this.opened()
        .filter(({ bodyType }, at) => bodyType !== this.bodyType() && this.forms()[at]?.unsaved())
        .map(({ bodyType }) => BODY_TYPE_NAMES[bodyType]),
    ),
  );
}

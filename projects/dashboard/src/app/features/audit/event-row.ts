import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  output,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { AuditEvent } from '#shared/contracts/audit';
import { Catalogue } from '../../core/catalogue/catalogue';
import { changeRows } from '../../ui/changes/change-rows';
import { ChangeTable } from '../../ui/changes/change-table';
import { plainName } from '../../ui/changes/field-names';
import { namesKnown } from '../../ui/changes/known-names';
import { valueWords } from '../../ui/changes/value-words';
import { formatExactInstant } from '../../ui/format';
import { actionWords } from './action-words';
import type { Subject } from './subject-words';

/** One event of the trail; opened, it shows what changed field by field and everything else it tells. */
@Component({
  selector: 'us-event-row',
  imports: [ChangeTable, RouterLink],
  templateUrl: './event-row.html',
  styleUrl: './event-row.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EventRow {
  private readonly catalogue = inject(Catalogue);

  readonly event = input.required<AuditEvent>();
  readonly subject = input.required<Subject>();
  /** Show only what was done to this. */
  readonly only = output<string>();

  protected readonly open = signal(false);
  protected readonly when = computed(() => formatExactInstant(this.event().at));
  protected readonly what = computed(() => actionWords(this.event().action));
  protected readonly from = computed(() => fromWords(this.event().address));
  protected readonly rows = computed(() =>
    changeRows(this.event().changes, namesKnown(this.catalogue)),
  );
  protected readonly more = computed(() =>
    Object.entries(this.event().detail).map(([name, held]) => ({
      name: plainName(name),
      text: valueWords(`/${name}`, held, namesKnown(this.catalogue)),
    })),
  );
}

/** Where something was done from; an IPv4 address that came wrapped in IPv6 is said as it is known. */
function fromWords(address: string): string {
  return address === 'local'
    ? 'on the server itself'
    : `from ${address.replace(/^::ffff:(?=\d+\.)/, '')}`;
}

import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { getSignal, type Signal } from '#shared/contracts/signals';
import { Api } from '../../core/api/api';
import { formatCount, formatShortDate } from '../../ui/format';
import { LoadState } from '../../ui/load-state/load-state';

/** The cars behind a signal as they stand today, each with what is wrong with it; fetched when it is opened. */
@Component({
  selector: 'us-signal-cars',
  imports: [LoadState, RouterLink],
  template: `
    <us-load-state [of]="detail" shape="rows">
      <ul aria-label="Cars behind the signal">
        @for (car of cars(); track car.jobRef) {
          <li>
            <a [routerLink]="car.link">{{ car.jobRef }}</a>
            <span
              >{{ car.name }} <span class="us-quiet">{{ car.year }}, {{ car.done }}</span></span
            >
            <span class="why">{{ car.why }}</span>
          </li>
        } @empty {
          <li class="us-quiet">None of them is on record any more.</li>
        }
      </ul>
      @if (more(); as left) {
        <p class="us-small us-quiet">{{ left }}</p>
      }
    </us-load-state>
  `,
  styles: `
    :host {
      display: block;
      padding: 4px 0 8px;
      font-size: 14px;
      line-height: 20px;
    }
    ul {
      list-style: none;
      border-top: 1px solid var(--us-ink);
    }
    li {
      display: grid;
      grid-template-columns: minmax(64px, 96px) minmax(180px, 2fr) 3fr;
      gap: 0 16px;
      padding: 5px 0;
      border-bottom: 1px solid var(--us-hairline);
      font-variant-numeric: tabular-nums;
      overflow-wrap: anywhere;
    }
    a {
      font-weight: 500;
    }
    @media (max-width: 719.98px) {
      li {
        grid-template-columns: minmax(64px, 88px) 1fr;
        padding: 8px 0;
      }
      .why {
        grid-column: 2;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignalCars {
  readonly of = input.required<Pick<Signal, 'branch' | 'id' | 'cars'>>();

  protected readonly detail = inject(Api).read(getSignal, () => {
    const { branch, id } = this.of();
    return { params: { branch, id } };
  });
  protected readonly cars = computed(() =>
    (this.detail.value()?.listed ?? []).map((car) => ({
      jobRef: car.jobRef,
      link: ['/jobs', this.of().branch, car.jobRef],
      name: `${car.make} ${car.model}`,
      year: car.firstRegistered.slice(0, 4),
      done: `finished ${formatShortDate(car.completedOn)}`,
      why: car.why,
    })),
  );
  protected readonly more = computed(() => {
    const left = this.of().cars - this.cars().length;
    if (left <= 0 || this.cars().length === 0) return '';
    return `${formatCount(left)} more ${left === 1 ? 'car is' : 'cars are'} behind it and not listed: the list ends here, or they were taken out since.`;
  });
}

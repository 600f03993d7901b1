import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { listJobs } from '#shared/contracts/job-list';
import { Api } from '../../core/api/api';
import { Catalogue } from '../../core/catalogue/catalogue';
import { ScopeState } from '../../core/scope-line/scope-state';
import { Session } from '../../core/session/session';
import { lackOf, nextSteps } from './next-steps';

/**
 * What to do next where there is nothing to see yet. A page puts it where it found no car; it asks whether the chosen branches have
 * any at all, and gives way to the page's own words between its tags when they have: another week, a longer time.
 */
@Component({
  selector: 'us-empty-next',
  imports: [MatButton, RouterLink],
  template: `
    @if (next(); as todo) {
      <section class="us-sheet us-unprinted" aria-labelledby="us-empty-next">
        <h2 id="us-empty-next">What to do next</h2>
        <p>{{ todo.why }}</p>
        @if (todo.steps.length > 0) {
          <p class="steps">
            @for (step of todo.steps; track step.link) {
              <a
                [matButton]="$first ? 'filled' : 'outlined'"
                [routerLink]="step.link"
                [queryParams]="step.query"
                >{{ step.words }}</a
              >
            }
          </p>
        }
      </section>
    } @else if (known()) {
      <ng-content />
    }
  `,
  styles: `
    :host {
      display: block;
    }
    section {
      max-width: 720px;
      margin-bottom: 24px;
    }
    .steps {
      display: flex;
      flex-wrap: wrap;
      gap: 8px 12px;
      margin-top: 12px;
    }
    a {
      text-decoration: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EmptyNext {
  private readonly catalogue = inject(Catalogue);
  private readonly scope = inject(ScopeState);
  private readonly role = inject(Session).role;
  /** All jobs of the chosen places, whatever their dates and kinds. */
  private readonly jobs = inject(Api).read(listJobs, () => {
    const { region, branch } = this.scope.filters();
    return { query: { region, branch, limit: 1 } };
  });

  protected readonly known = computed(() => this.jobs.value() !== undefined);
  protected readonly next = computed(() => {
    const role = this.role();
    const known = this.catalogue.value();
    const jobs = this.jobs.value()?.jobs;
    if (!role || !known || jobs === undefined) return undefined;
    const { branches, packages } = known;
    const lack = lackOf({ branches: branches.length, packages: packages.length, jobs });
    return lack && nextSteps(lack, role, this.oneBranch());
  });

  private oneBranch(): string | undefined {
    const [only, ...others] = this.scope.branches();
    return others.length === 0 ? only : undefined;
  }
}

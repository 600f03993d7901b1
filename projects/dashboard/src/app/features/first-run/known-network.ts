import { computed, inject, Injectable } from '@angular/core';
import { listJobs } from '#shared/contracts/job-list';
import { listPeople } from '#shared/contracts/people';
import { getCosts } from '#shared/contracts/set-up';
import { getNetwork } from '#shared/contracts/set-up-help';
import { Api } from '../../core/api/api';
import { joinReadings } from '../../core/api/join-readings';
import { Catalogue } from '../../core/catalogue/catalogue';
import type { KnownSoFar } from './first-steps';

/** Before any job of a network that starts now. */
const LONG_AGO = '1990-01-01';

/** What the network has by now, read from the data so that a step done stays done after a reload. */
@Injectable()
export class KnownNetwork {
  private readonly api = inject(Api);
  private readonly catalogue = inject(Catalogue);
  readonly network = this.api.read(getNetwork, () => ({}));
  readonly costs = this.api.read(getCosts, () => ({}));
  readonly people = this.api.read(listPeople, () => ({}));
  private readonly jobs = this.api.read(listJobs, () => {
    const to = this.catalogue.today();
    return to === undefined ? undefined : { query: { from: LONG_AGO, to, limit: 1 } };
  });
  readonly state = joinReadings({
    catalogue: this.catalogue.state,
    network: this.network,
    costs: this.costs,
    people: this.people,
    jobs: this.jobs,
  });

  readonly soFar = computed((): KnownSoFar => {
    const {
      regions = [],
      branches = [],
      products = [],
      packages = [],
      norms = [],
    } = this.catalogue.value() ?? {};
    const costs = this.costs.value();
    const people = this.people.value()?.items ?? [];
    return {
      feeSet: (this.network.value()?.feeRate ?? null) !== null,
      regions: regions.length,
      branches: branches.length,
      branchesWithRate: new Set(costs?.rates.map(({ branch }) => branch)).size,
      products: products.length,
      productsWithCost: new Set(costs?.products.map(({ product }) => product)).size,
      packages: packages.length,
      norms: norms.length,
      others: people.filter(({ role }) => role !== 'head_office').length,
      jobs: this.jobs.value()?.items.length ?? 0,
    };
  });

  /** After something was saved. */
  reload(): void {
    this.catalogue.state.reload();
    this.network.reload();
    this.costs.reload();
    this.people.reload();
  }
}

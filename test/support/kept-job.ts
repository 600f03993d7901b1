import type { SentJob } from '#shared/domain/normalise-job';

/**
 * A billed job without labour or product that keeps an exact share of the 1,000.00 it bills, for tests about weeks: the rest
 * went to the fee of 5 % and to things bought in.
 */
export function keptJob(completedOn: string, share: number): SentJob {
  return {
    ...unbilledJob(completedOn),
    boughtInCents: 95_000 - Math.round(share * 100_000),
    invoice: { number: '1', issuedOn: completedOn, totalCents: 100_000 },
  };
}

/** A job without labour, product, estimate or bill. */
export function unbilledJob(completedOn: string): SentJob {
  return {
    vehicle: { make: 'Vela', model: 'Ono', bodyType: 'van', firstRegistered: '2010-01' },
    package: 'full',
    completedOn,
    estimate: undefined,
    actual: { stages: {} },
    products: [],
    invoice: undefined,
  };
}

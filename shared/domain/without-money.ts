import type { Moneyed } from './keep-stored-money';

/** A job that tells no amount but the price quoted. */
export type WithoutMoney<Job extends Moneyed> = Omit<Job, 'boughtInCents' | 'invoice'> & {
  invoice?: Omit<NonNullable<Job['invoice']>, 'totalCents'>;
};

/** A job, finished or under way, as a recorder sees it: no amount but the price quoted (rule 24). */
export function withoutMoney<Job extends Moneyed>(job: Job): WithoutMoney<Job> {
  const { boughtInCents: _bought, invoice, findings, consumables, agreedExtras, ...rest } = job;
  const { totalCents: _total, ...bill } = invoice ?? {};
  return {
    ...rest,
    ...(findings && {
      findings: findings.map(({ chargedCents: _charged, ...finding }) => finding),
    }),
    ...(consumables && {
      consumables: consumables.map(({ unitCostCents: _unit, ...line }) => line),
    }),
    ...(agreedExtras && {
      agreedExtras: agreedExtras.map(({ priceCents: _price, ...extra }) => extra),
    }),
    ...(invoice && { invoice: bill }),
  } as WithoutMoney<Job>;
}

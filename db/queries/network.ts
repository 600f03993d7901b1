import { FROM_THE_START } from '#shared/domain/cost-book';
import { rateOfMicros } from '#shared/domain/money';
import { sql, type Query } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** Whatever reads the network's own row: it belongs to no branch. */
interface NetworkRowReader {
  first<Row>(query: Query): Row | undefined;
}

export interface NetworkRow {
  name: string;
  currency: string;
  feeRate: number | null;
  targetMarginShare: number | null;
  claimLimitCents: number | null;
}

/** The network's own settings; `feeRate` is the one valid from the start. */
export function readNetwork(db: NetworkRowReader): NetworkRow {
  const row = db.first<Omit<NetworkRow, 'feeRate'> & { feeMicros: number | null }>(
    sql('network')
      .leftJoin('network_fees', (join) =>
        join.on('network_fees.from_date', sql.raw('?', [FROM_THE_START])),
      )
      .select('name', 'currency', {
        targetMarginShare: 'target_margin_share',
        claimLimitCents: 'claim_limit_cents',
        feeMicros: 'fee_micros',
      }),
  );
  if (!row) throw new Error('the network row is gone');
  const { feeMicros, ...rest } = row;
  return { ...rest, feeRate: feeMicros === null ? null : rateOfMicros(feeMicros) };
}

/** Whether head office has set the network up: the base fee rate is there. */
export function isNetworkSet(db: UnscopedDb): boolean {
  return readNetwork(db).feeRate !== null;
}

export function writeNetwork(db: UnscopedDb, row: Omit<NetworkRow, 'feeRate'>): void {
  db.run(
    sql('network').update({
      name: row.name,
      currency: row.currency,
      target_margin_share: row.targetMarginShare,
      claim_limit_cents: row.claimLimitCents,
    }),
  );
}

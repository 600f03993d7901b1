import type { BodyType } from '#shared/domain/vocabulary';
import type { ScopedBranch } from '../scope';
import type { ScopedDb } from '../scoped-db';
import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

export interface BookingRow {
  branch: string;
  ref: string;
  expectedOn: string;
  package: string;
  bodyType: BodyType;
}

/** Cars expected at a branch from a day on, soonest first. */
export function listBookings(db: ScopedDb, branch: string, from: string): BookingRow[] {
  return db.all<BookingRow>(
    db
      .table('bookings')
      .join('branches', 'branches.id', 'bookings.branch_id')
      .join('packages', 'packages.id', 'bookings.package_id')
      .where('branches.code', branch)
      .where('expected_on', '>=', from)
      .orderBy(['expected_on', 'ref'])
      .select({
        branch: 'branches.code',
        ref: 'ref',
        expectedOn: 'expected_on',
        package: 'packages.code',
        bodyType: 'body_type',
      }),
  );
}

/** What a booking says. */
export type Booking = Pick<BookingRow, 'expectedOn' | 'package' | 'bodyType'>;

/** A booking of a branch, inside a write. */
export function findBookingRow(
  db: UnscopedDb,
  branch: ScopedBranch,
  ref: string,
): Booking | undefined {
  return db.first<Booking>(
    sql('bookings')
      .join('packages', 'packages.id', 'bookings.package_id')
      .where({ branch_id: branch.id, ref })
      .select({ expectedOn: 'expected_on', package: 'packages.code', bodyType: 'body_type' }),
  );
}

/** Writes a booking of a branch, inside a write; says whether it is new. */
export function putBookingRow(
  db: UnscopedDb,
  branch: ScopedBranch,
  booking: { ref: string; expectedOn: string; packageId: number; bodyType: BodyType },
): 'created' | 'changed' {
  const key = { branch_id: branch.id, ref: booking.ref };
  const values = {
    expected_on: booking.expectedOn,
    package_id: booking.packageId,
    body_type: booking.bodyType,
  };
  if (db.run(sql('bookings').where(key).update(values)).changes > 0) return 'changed';
  db.run(sql('bookings').insert({ ...key, ...values }));
  return 'created';
}

/** Removes a booking of a branch, inside a write; says whether there was one. */
export function deleteBookingRow(db: UnscopedDb, branch: ScopedBranch, ref: string): boolean {
  return db.run(sql('bookings').where({ branch_id: branch.id, ref }).delete()).changes > 0;
}

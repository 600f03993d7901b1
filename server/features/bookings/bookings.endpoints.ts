import { recordAudit } from '#db/queries/audit';
import {
  deleteBookingRow,
  findBookingRow,
  listBookings,
  putBookingRow,
  type Booking,
} from '#db/queries/bookings';
import type { ScopedBranch } from '#db/scope';
import {
  deleteBooking,
  listBookings as listContract,
  putBooking,
} from '#shared/contracts/bookings';
import { localDate } from '#shared/domain/calendar';
import { notFound } from '#shared/domain/refusal';
import { deedOf } from '../../http/deed';
import { mount, namedBranch, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';

/** Cars a branch expects (rule 75). */
export function mountBookings(mounting: Mounting, kit: Kit): void {
  const { store } = kit;

  mount(
    mounting,
    putBooking,
    async (call) => {
      const branch = namedBranch(call);
      const { ref } = call.params;
      const { expectedOn, bodyType, package: code } = call.body;
      const packageId = store.state.package(code)?.id;
      if (packageId === undefined) throw new Error('a package that the rules have found is gone');
      const put = await store.queue.write(() => {
        const before = findBookingRow(store.unscoped, branch, ref);
        const after = { expectedOn, package: code, bodyType };
        const put = putBookingRow(store.unscoped, branch, { ref, expectedOn, packageId, bodyType });
        // A system that sends the same bookings every night changes nothing.
        if (!before || !sameBooking(before, after)) {
          recordAudit(store.unscoped, {
            ...toldOf(call, branch),
            action: 'booking.set',
            detail: { before: before ?? null, after },
          });
        }
        return put;
      });
      return {
        status: put === 'created' ? 201 : 200,
        body: { branch: branch.code, ref, ...call.body },
      };
    },
    {
      rules: (raw) => {
        const code = typeof raw === 'object' && raw !== null && 'package' in raw && raw.package;
        return typeof code === 'string' && !store.state.package(code)
          ? [{ path: '/package', message: 'no package has this code' }]
          : [];
      },
    },
  );

  mount(mounting, deleteBooking, async (call) => {
    const branch = namedBranch(call);
    await store.queue.write(() => {
      const before = findBookingRow(store.unscoped, branch, call.params.ref);
      if (!before) throw notFound();
      deleteBookingRow(store.unscoped, branch, call.params.ref);
      recordAudit(store.unscoped, {
        ...toldOf(call, branch),
        action: 'booking.remove',
        detail: { before, after: null },
      });
    });
    return {};
  });

  mount(mounting, listContract, (call) => {
    const branch = namedBranch(call);
    const today = localDate(kit.clock.now(), branch.timeZone);
    return { body: { items: listBookings(store.scoped(call.scope), branch.code, today) } };
  });
}

function toldOf(call: Call<{ ref: string }>, branch: ScopedBranch) {
  const subject = `/branches/${branch.code}/bookings/${call.params.ref}`;
  return { ...deedOf(call, subject), branchId: branch.id };
}

function sameBooking(a: Booking, b: Booking): boolean {
  return a.expectedOn === b.expectedOn && a.package === b.package && a.bodyType === b.bodyType;
}

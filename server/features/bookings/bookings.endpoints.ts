import { deleteBookingRow, listBookings, putBookingRow } from '#db/queries/bookings';
import {
  deleteBooking,
  listBookings as listContract,
  putBooking,
} from '#shared/contracts/bookings';
import { localDate } from '#shared/domain/calendar';
import { notFound } from '#shared/domain/refusal';
import { mount, namedBranch, type Mounting } from '../../http/mount';
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
      const put = await store.queue.write(() =>
        putBookingRow(store.unscoped, branch, { ref, expectedOn, packageId, bodyType }),
      );
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
    const gone = await store.queue.write(() =>
      deleteBookingRow(store.unscoped, branch, call.params.ref),
    );
    if (!gone) throw notFound();
    return {};
  });

  mount(mounting, listContract, (call) => {
    const branch = namedBranch(call);
    const today = localDate(kit.clock.now(), branch.timeZone);
    return { body: { items: listBookings(store.scoped(call.scope), branch.code, today) } };
  });
}

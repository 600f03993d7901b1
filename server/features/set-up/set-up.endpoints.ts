import * as catalogue from '#db/queries/catalogue';
import * as rows from '#db/queries/set-up';
import * as contract from '#shared/contracts/set-up';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { changeCatalogue } from './change-catalogue';
import { deedOf, statusOf } from '../../http/deed';
import { breaksOfBranch } from './check-set-up';
import { mountCosts } from './costs.endpoints';
import { mountNetwork } from './network.endpoints';

/** Set-up by head office: the catalogue, the costs, the network itself. */
export function mountSetUp(mounting: Mounting, kit: Kit): void {
  mountCatalogue(mounting, kit);
  mountCosts(mounting, kit);
  mountNetwork(mounting, kit);
}

function mountCatalogue(mounting: Mounting, { store }: Kit): void {
  const isRegion = (code: string): boolean =>
    catalogue.findRegion(store.unscoped, code) !== undefined;

  mount(mounting, contract.putRegion, async (call) => {
    const { code } = call.params;
    const region = { code, name: call.body.name, climate: call.body.climate ?? null };
    const put = await changeCatalogue(
      store,
      'region.set',
      () => ({
        before: catalogue.findRegion(store.unscoped, code) ?? null,
        after: region,
        put: rows.putRegionRow(store.unscoped, region),
      }),
      deedOf(call, `/regions/${code}`),
    );
    return { status: statusOf(put), body: region };
  });

  mount(
    mounting,
    contract.putBranch,
    async (call) => {
      const { code } = call.params;
      const { closedOn = null, targetMarginShare = null, ...given } = call.body;
      const branch = { code, ...given, closedOn, targetMarginShare };
      const put = await changeCatalogue(
        store,
        'branch.set',
        () => ({
          before: catalogue.findBranch(store.unscoped, code) ?? null,
          after: branch,
          put: rows.putBranchRow(store.unscoped, branch),
        }),
        deedOf(call, `/branches/${code}`),
      );
      return { status: statusOf(put), body: branch };
    },
    { rules: (raw) => breaksOfBranch(raw, isRegion) },
  );

  mount(mounting, contract.putProduct, async (call) => {
    const product = { code: call.params.code, ...call.body };
    const put = await changeCatalogue(
      store,
      'product.set',
      () => ({
        before: catalogue.listProducts(store.unscoped).find(sameCode(product.code)) ?? null,
        after: product,
        put: rows.putProductRow(store.unscoped, product),
      }),
      deedOf(call, `/products/${product.code}`),
    );
    return { status: statusOf(put), body: product };
  });

  mount(mounting, contract.putPackage, async (call) => {
    const entry = { code: call.params.code, ...call.body };
    const put = await changeCatalogue(
      store,
      'package.set',
      () => ({
        before: catalogue.listPackages(store.unscoped).find(sameCode(entry.code)) ?? null,
        after: entry,
        put: rows.putPackageRow(store.unscoped, entry),
      }),
      deedOf(call, `/packages/${entry.code}`),
    );
    return { status: statusOf(put), body: entry };
  });
}

function sameCode(code: string): (row: { code: string }) => boolean {
  return (row) => row.code === code;
}

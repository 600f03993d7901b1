import * as catalogue from '#db/queries/catalogue';
import * as contract from '#shared/contracts/set-up';
import type { CostChange } from '#shared/domain/cost-book';
import { feeRateMicros } from '#shared/domain/money';
import { mount, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { breaksOfNorm } from './check-set-up';
import { changeCosts } from './change-costs';
import { deedOf, statusOf } from '../../http/deed';

/** Dated costs, fees and norms; each change restates the jobs it touches before it is answered. */
export function mountCosts(mounting: Mounting, kit: Kit): void {
  const { store } = kit;
  const isProduct = (code: string): boolean => store.state.productId(code) !== undefined;

  const dated = async (
    call: Call,
    change: Exclude<CostChange, { kind: 'norm' }>,
    subject: string,
  ) => {
    const { put, restatedJobs } = await changeCosts(store, change, deedOf(call, subject));
    return { status: statusOf(put), body: { from: change.from, restatedJobs } };
  };

  mount(
    mounting,
    contract.putRate,
    (call) => {
      const { code, from } = call.params;
      const value = call.body.hourlyCostCents;
      return dated(
        call,
        { kind: 'hourlyCost', code, from, value },
        `/branches/${code}/rates/${from}`,
      );
    },
    { exists: ({ params, scope }) => scope.branch(params.code) !== undefined },
  );

  mount(
    mounting,
    contract.putProductCost,
    (call) => {
      const { code, from } = call.params;
      const value = call.body.costPerLitreCents;
      return dated(call, { kind: 'product', code, from, value }, `/products/${code}/costs/${from}`);
    },
    { exists: ({ params }) => isProduct(params.code) },
  );

  mount(mounting, contract.putConsumableCost, (call) => {
    const { kind: code, from } = call.params;
    const value = call.body.unitCostCents;
    return dated(
      call,
      { kind: 'consumable', code, from, value },
      `/consumables/${code}/costs/${from}`,
    );
  });

  mount(mounting, contract.putFee, (call) => {
    const { from } = call.params;
    const value = feeRateMicros(call.body.feeRate);
    return dated(call, { kind: 'fee', from, value }, `/network/fees/${from}`);
  });

  mount(
    mounting,
    contract.putNorms,
    async (call) => {
      const { code, bodyType } = call.params;
      const lines = call.body.norms;
      const { put, restatedJobs } = await changeCosts(
        store,
        { kind: 'norm', package: code, bodyType, lines },
        deedOf(call, `/packages/${code}/norms/${bodyType}`),
      );
      return {
        status: statusOf(put),
        body: { package: code, bodyType, norms: lines, restatedJobs },
      };
    },
    {
      exists: ({ params }) => store.state.package(params.code) !== undefined,
      rules: (raw) => breaksOfNorm(raw, isProduct),
    },
  );

  mount(mounting, contract.getCosts, (call) => ({
    body: {
      fees: catalogue.listFees(store.unscoped),
      rates: catalogue.listRates(store.scoped(call.scope)),
      products: catalogue.listProductCosts(store.unscoped),
      consumables: catalogue.listConsumableCosts(store.unscoped),
    },
  }));
}

import * as catalogue from '#db/queries/catalogue';
import * as contract from '#shared/contracts/set-up';
import type { CostChange } from '#shared/domain/cost-book';
import { feeRateMicros } from '#shared/domain/money';
import { notFound, refuseInput } from '#shared/domain/refusal';
import { mount, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { changeCosts } from './change-costs';
import { deedOf, statusOf } from '../../http/deed';

/** Dated costs, fees and norms; each change restates the jobs it touches before it is answered. */
export function mountCosts(mounting: Mounting, kit: Kit): void {
  const { store } = kit;

  const dated = async (
    call: Call,
    change: Exclude<CostChange, { kind: 'norm' }>,
    subject: string,
  ) => {
    const { put, restatedJobs } = await changeCosts(store, change, deedOf(call, subject));
    return { status: statusOf(put), body: { from: change.from, restatedJobs } };
  };

  mount(mounting, contract.putRate, (call) => {
    const { code, from } = call.params;
    if (!catalogue.findBranch(store.unscoped, code)) throw notFound();
    const value = call.body.hourlyCostCents;
    return dated(
      call,
      { kind: 'hourlyCost', code, from, value },
      `/branches/${code}/rates/${from}`,
    );
  });

  mount(mounting, contract.putProductCost, (call) => {
    const { code, from } = call.params;
    if (store.state.productId(code) === undefined) throw notFound();
    const value = call.body.costPerLitreCents;
    return dated(call, { kind: 'product', code, from, value }, `/products/${code}/costs/${from}`);
  });

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

  mount(mounting, contract.putNorms, async (call) => {
    const { code, bodyType } = call.params;
    if (!store.state.package(code)) throw notFound();
    const lines = call.body.norms;
    checkNorm(lines, (product) => store.state.productId(product) !== undefined);
    const { put, restatedJobs } = await changeCosts(
      store,
      { kind: 'norm', package: code, bodyType, lines },
      deedOf(call, `/packages/${code}/norms/${bodyType}`),
    );
    return {
      status: statusOf(put),
      body: { package: code, bodyType, norms: lines, restatedJobs },
    };
  });

  mount(mounting, contract.getCosts, (call) => ({
    body: {
      fees: catalogue.listFees(store.unscoped),
      rates: catalogue.listRates(store.scoped(call.scope)),
      products: catalogue.listProductCosts(store.unscoped),
      consumables: catalogue.listConsumableCosts(store.unscoped),
    },
  }));
}

function checkNorm(
  lines: readonly { product: string }[],
  isProduct: (code: string) => boolean,
): void {
  const seen = new Set<string>();
  const problems = lines.flatMap(({ product }, index) => {
    const path = `/norms/${index}/product`;
    if (!isProduct(product)) return [{ path, message: 'no product has this code' }];
    if (seen.has(product)) return [{ path, message: 'this product is in the norm already' }];
    seen.add(product);
    return [];
  });
  if (problems.length > 0) throw refuseInput(problems);
}

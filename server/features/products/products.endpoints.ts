import { getProductNeed, getProducts } from '#shared/contracts/products';
import { mount, type Mounting } from '../../http/mount';
import { scopeQuestion } from '../../http/scope-question';
import type { Kit } from '../../kit';

/** Product use and the coming need, computed in a worker. */
export function mountProducts(mounting: Mounting, kit: Kit): void {
  mount(mounting, getProducts, async (call) => {
    const { scope, period, filters } = scopeQuestion(kit, call.scope, call.query);
    return { body: await kit.reads.answer('products', scope, { period, filters }) };
  });

  mount(mounting, getProductNeed, async (call) => {
    const { scope, ...question } = scopeQuestion(kit, call.scope, call.query);
    return { body: await kit.reads.answer('productNeed', scope, question) };
  });
}

import * as catalogue from '#db/queries/catalogue';
import { readNetwork } from '#db/queries/network';
import type { CatalogueRow } from '#db/queries/referrers';
import {
  getNetwork,
  getNormMedians,
  removePackage,
  removeProduct,
  tellEffect,
  type Effect,
  type PlannedChange,
} from '#shared/contracts/set-up-help';
import { defaultPeriod } from '#shared/domain/period';
import { notFound } from '#shared/domain/refusal';
import { todayIn } from '../../clock';
import { deedOf } from '../../http/deed';
import { mount, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { breaksOfPlan, costChangeOf, type KnownSetUp } from './read-plan';
import { takeOut } from './take-out';

/** What helps head office to set the network up: what a change would move, what norms to take, what may be taken out. */
export function mountSetUpHelp(mounting: Mounting, kit: Kit): void {
  const { store } = kit;
  const known: KnownSetUp = {
    isBranch: (code) => store.state.branches.some((branch) => branch.code === code),
    isRegion: (code) => catalogue.findRegion(store.unscoped, code) !== undefined,
    isProduct: (code) => store.state.productId(code) !== undefined,
    isPackage: (code) => store.state.package(code) !== undefined,
  };

  mount(mounting, getNetwork, () => ({ body: readNetwork(store.unscoped) }));

  mount(
    mounting,
    tellEffect,
    async (call) => {
      const planned = call.body.change;
      const change = costChangeOf(planned) ?? carsOf(kit, planned);
      if (!change) return { body: onNewWarranties(kit, planned) };
      const today = todayIn(call.scope, kit.clock);
      return { body: await kit.reads.answer('effect', call.scope, { change, today }) };
    },
    { rules: (raw) => breaksOfPlan(raw, known) },
  );

  mount(
    mounting,
    getNormMedians,
    async (call) => {
      const packageId = store.state.package(call.params.code)?.id;
      if (packageId === undefined) throw notFound();
      const asked = {
        packageId,
        bodyType: call.params.bodyType,
        period: defaultPeriod(todayIn(call.scope, kit.clock)),
      };
      return { body: await kit.reads.answer('normMedians', call.scope, asked) };
    },
    { exists: ({ params }) => known.isPackage(params.code) },
  );

  const remove = async (call: Call, row: CatalogueRow) => {
    const referrers = await kit.reads.answer('referrers', call.scope, row);
    const rows =
      row.kind === 'product'
        ? catalogue.listProducts(store.unscoped)
        : catalogue.listPackages(store.unscoped);
    const before = rows.find(({ code }) => code === row.code);
    if (!before) throw notFound();
    const subject = `/${row.kind}s/${row.code}`;
    await takeOut(store, row, referrers, before, deedOf(call, subject));
    return {};
  };

  mount(
    mounting,
    removeProduct,
    (call) => remove(call, { kind: 'product', code: call.params.code }),
    { exists: ({ params }) => known.isProduct(params.code) },
  );
  mount(
    mounting,
    removePackage,
    (call) => remove(call, { kind: 'package', code: call.params.code }),
    { exists: ({ params }) => known.isPackage(params.code) },
  );
}

/** A change of which cars belong together; `undefined` for one that moves no car there is. */
function carsOf({ store }: Kit, planned: PlannedChange) {
  if (planned.kind === 'climate') {
    const figures: Effect['figures'] = ['corrosivity'];
    return { kind: 'cars' as const, place: { region: planned.region }, figures };
  }
  if (planned.kind !== 'branchRegion') return undefined;
  const stays = store.state.branches.some(
    ({ code, region }) => code === planned.branch && region === planned.region,
  );
  if (stays) return undefined;
  const figures: Effect['figures'] = ['region_comparison'];
  return { kind: 'cars' as const, place: { branch: planned.branch }, figures };
}

/** Warranty already sold keeps its length (rule 10): only cars to come get another. */
function onNewWarranties({ store }: Kit, planned: PlannedChange): Effect {
  const moves =
    planned.kind === 'warranty' &&
    store.state.package(planned.package)?.warrantyMonths !== planned.warrantyMonths;
  return {
    jobs: 0,
    branches: 0,
    from: null,
    to: null,
    marginCents: null,
    figures: moves ? ['new_warranties'] : [],
  };
}

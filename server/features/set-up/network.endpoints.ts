import { recordAudit } from '#db/queries/audit';
import * as catalogue from '#db/queries/catalogue';
import { isNetworkSet, readNetwork, writeNetwork } from '#db/queries/network';
import { putCost } from '#db/queries/set-up';
import * as contract from '#shared/contracts/set-up';
import { FROM_THE_START } from '#shared/domain/cost-book';
import { feeRateMicros } from '#shared/domain/money';
import type { BodyType } from '#shared/domain/vocabulary';
import { moneyFor } from '../../auth/caller';
import { todayIn } from '../../clock';
import { mount, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { deedOf } from '../../http/deed';

/** The network's own settings, and the catalogue that everyone signed in reads (rule 79). */
export function mountNetwork(mounting: Mounting, kit: Kit): void {
  const { store } = kit;

  mount(mounting, contract.putNetwork, async (call) => {
    const { feeRate, targetMarginShare = null, claimLimitCents = null, ...named } = call.body;
    const network = { ...named, targetMarginShare, claimLimitCents };
    const { actor, at, subject } = deedOf(call, '/network');
    const fee = {
      kind: 'fee',
      from: FROM_THE_START,
      value: feeRateMicros(feeRate),
    } as const;
    const { recorded: wasSet } = await store.restatement.apply(fee, () => {
      // Inside the write: of two at once, the second finds what the first has set.
      const wasSet = isNetworkSet(store.unscoped);
      const before = readNetwork(store.unscoped);
      putCost(store.unscoped, fee);
      writeNetwork(store.unscoped, network);
      recordAudit(store.unscoped, {
        at,
        actor,
        action: 'network.set',
        subject,
        branchId: null,
        detail: { before, after: { ...network, feeRate } },
      });
      return wasSet;
    });
    return { status: wasSet ? 200 : 201, body: { ...network, feeRate } };
  });

  mount(mounting, contract.getCatalogue, (call) => {
    const { regions, branches } = call.scope.echo();
    const { name, currency, claimLimitCents } = readNetwork(store.unscoped);
    const limit = moneyFor(call.caller) === 'seen' ? { claimLimitCents } : {};
    return {
      body: {
        network: { name, currency, ...limit },
        // A region is set up before its first branch, and must be there to be chosen for it.
        regions: call.scope.ofNetwork
          ? catalogue.listAllRegions(store.unscoped)
          : catalogue.listRegions(store.unscoped, regions),
        branches: catalogue.listBranches(store.unscoped, branches),
        packages: catalogue.listPackages(store.unscoped),
        products: catalogue.listProducts(store.unscoped),
        norms: grouped(catalogue.listNorms(store.unscoped)),
        today: todayIn(call.scope, kit.clock),
      },
    };
  });
}

type NormLine = ReturnType<typeof catalogue.listNorms>[number];

function grouped(
  lines: readonly NormLine[],
): { package: string; bodyType: BodyType; norms: { product: string; ml: number }[] }[] {
  const norms = new Map<string, ReturnType<typeof grouped>[number]>();
  for (const line of lines) {
    const key = `${line.package} ${line.bodyType}`;
    const norm = norms.get(key) ?? { package: line.package, bodyType: line.bodyType, norms: [] };
    norm.norms.push({ product: line.product, ml: line.ml });
    norms.set(key, norm);
  }
  return [...norms.values()];
}

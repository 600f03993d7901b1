import type { Connection } from '#db/database';
import type { NetworkReference } from '#db/network-reference';
import { readQuoteFigures } from '#db/queries/quote';
import { readUsualFigures } from '#db/queries/usual';
import { nearestNetworkSet } from '#db/quote-reference';
import type { Scope } from '#db/scope';

/** What keeps figures of the network from those who stand against too few others. */
export interface Guarded {
  connection: Connection;
  scope: Scope;
  enoughBehind(): boolean;
  nearestQuoteSet: NetworkReference['nearestQuoteSet'];
  nearestUsualSet: NetworkReference['nearestUsualSet'];
}

/** The nearest set of the network's cars whoever stands behind it. */
export function unguardedQuoteSet(
  this: Guarded,
  ...[car, rungs, cars]: Parameters<Guarded['nearestQuoteSet']>
): ReturnType<Guarded['nearestQuoteSet']> {
  const [branch] = this.scope.branches;
  const need = { cars, others: 0 };
  return (
    branch && nearestNetworkSet(this.connection, branch.id, car, rungs, need, readQuoteFigures)
  );
}

/** The same with what its cars usually take, whoever stands behind any figure. */
export function unguardedUsualSet(
  this: Guarded,
  ...[car, rungs, cars]: Parameters<Guarded['nearestUsualSet']>
): ReturnType<Guarded['nearestUsualSet']> {
  const [branch] = this.scope.branches;
  const need = { cars, others: 0 };
  return (
    branch &&
    nearestNetworkSet(this.connection, branch.id, car, rungs, need, (source, ...set) =>
      readUsualFigures(source, branch.id, ...set, () => true),
    )
  );
}

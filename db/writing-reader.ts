import { Scope, type ScopedBranch } from './scope';
import { ScopedDb } from './scoped-db';
import type { Store } from './store';

/** A reader of one branch's rows on the writing connection: what a writer asks for may be of the commit that is under way. */
export function writingReader(store: Pick<Store, 'writing'>, branch: ScopedBranch): ScopedDb {
  return new ScopedDb(store.writing, Scope.ofBranch(branch));
}

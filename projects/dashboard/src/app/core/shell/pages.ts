import type { Role } from '#shared/domain/vocabulary';

/** A page named in the header. */
export interface Page {
  readonly path: string;
  readonly name: string;
  /** Roles that may open it. */
  readonly roles: readonly Role[];
}

const READERS: readonly Role[] = ['site_manager', 'regional_lead', 'head_office'];

const SENDERS: readonly Role[] = ['recorder', 'site_manager', 'head_office'];

/** The pages there are, in the order in which they are read. */
export const PAGES: readonly Page[] = [
  { path: '/send', name: 'Send a job', roles: ['recorder'] },
  { path: '/warranty', name: 'Warranty', roles: ['head_office'] },
  { path: '/branches', name: 'Branches', roles: ['regional_lead'] },
  { path: '/this-week', name: 'This week', roles: READERS },
  { path: '/overruns', name: 'Overruns', roles: READERS },
  { path: '/rot', name: 'Rot', roles: READERS },
  { path: '/product', name: 'Product', roles: READERS },
  { path: '/warranty', name: 'Warranty', roles: ['site_manager', 'regional_lead'] },
  { path: '/branches', name: 'Branches', roles: ['site_manager', 'head_office'] },
  { path: '/signals', name: 'Signals', roles: READERS },
  { path: '/jobs', name: 'Jobs', roles: [...READERS, 'recorder'] },
  { path: '/send', name: 'Send a job', roles: SENDERS.filter((role) => role !== 'recorder') },
  { path: '/come-backs', name: 'Come-backs', roles: READERS },
  { path: '/quote', name: 'Quote', roles: [...READERS, 'recorder'] },
];

/** Pages that stand behind others and have no word in the header; the menu of a narrow window says which of them is open. */
export const PAGES_BEHIND: readonly Pick<Page, 'path' | 'name'>[] = [
  { path: '/actions', name: 'Actions' },
  { path: '/targets', name: 'Targets' },
];

import type { Page } from 'playwright-core';
import type { Role } from '#shared/domain/vocabulary';

/** A page of the product as someone comes to it. */
export interface Stop {
  /** Names the pictures kept of it. */
  name: string;
  path: string;
  as: Role | 'nobody';
  /** Brings it into the state to look at: something opened, something typed wrong. */
  prepare?: (page: Page) => Promise<unknown>;
  /** What the page's own request is refused with, where that is the point. */
  refused?: RegExp;
}

/** Job sheets to look at, by what is on them. */
export interface KnownJobs {
  rotten: string;
  unbilled: string;
  corrected: string;
}

/** A car that the demo branch has seen often. */
export const QUOTED =
  'make=Velder&model=Tessock&firstRegistered=2012-05&bodyType=hatchback&package=full&branch=HAV';

/** A claim that the demo branch has on record. */
export const CLAIM = 'HAV/W-0040';

/** Every page there is. */
export function everyPage({ rotten, unbilled }: KnownJobs): Stop[] {
  return [
    { name: 'sign-in', path: '/sign-in', as: 'nobody' },
    { name: 'sign-in-forgot', path: '/sign-in/forgot', as: 'nobody' },
    { name: 'welcome', path: '/welcome?token=0123&purpose=invitation', as: 'nobody' },
    // A link that nobody signed: a good one is followed from Mailbox in stop-a-mail.spec.ts.
    {
      name: 'unsubscribe',
      path: '/unsubscribe?token=0123',
      as: 'nobody',
      refused: /mail\/unsubscribe/,
    },
    { name: 'this-week', path: '/this-week', as: 'site_manager' },
    { name: 'this-week-network', path: '/this-week', as: 'head_office' },
    { name: 'overruns', path: '/overruns', as: 'site_manager' },
    { name: 'overruns-network', path: '/overruns?by=branch', as: 'head_office' },
    { name: 'rot', path: '/rot', as: 'site_manager' },
    { name: 'rot-network', path: '/rot?age=10-14', as: 'head_office' },
    { name: 'product', path: '/product', as: 'site_manager' },
    { name: 'product-network', path: '/product?product=SC1', as: 'head_office' },
    { name: 'branches', path: '/branches', as: 'regional_lead' },
    { name: 'branches-manager', path: '/branches?measure=rot', as: 'site_manager' },
    { name: 'branches-claims', path: '/branches?measure=claims', as: 'regional_lead' },
    { name: 'branches-product', path: '/branches?measure=product', as: 'head_office' },
    {
      name: 'branches-network',
      path: '/branches?measure=margin&with=HAV,SKU',
      as: 'head_office',
    },
    { name: 'warranty', path: '/warranty', as: 'site_manager' },
    { name: 'warranty-lead', path: '/warranty', as: 'regional_lead' },
    { name: 'warranty-network', path: '/warranty', as: 'head_office' },
    { name: 'warranty-reports', path: '/warranty/reports', as: 'head_office' },
    { name: 'warranty-schedule', path: '/warranty/reports/schedule', as: 'head_office' },
    { name: 'jobs', path: '/jobs', as: 'site_manager' },
    { name: 'jobs-recorder', path: '/jobs', as: 'recorder' },
    { name: 'claims', path: '/claims', as: 'site_manager' },
    { name: 'claims-recorder', path: '/claims', as: 'recorder' },
    { name: 'claims-network', path: '/claims?decision=open', as: 'head_office' },
    { name: 'claims-lead', path: '/claims?counted=false&sort=cost', as: 'regional_lead' },
    { name: 'claim', path: `/claims/${CLAIM}`, as: 'site_manager' },
    { name: 'claim-recorder', path: `/claims/${CLAIM}`, as: 'recorder' },
    { name: 'claim-new', path: `/jobs/HAV/${rotten}/claim`, as: 'site_manager' },
    { name: 'claim-new-recorder', path: `/jobs/HAV/${rotten}/claim`, as: 'recorder' },
    { name: 'job-sheet', path: `/jobs/HAV/${rotten}`, as: 'site_manager' },
    { name: 'job-sheet-unbilled', path: `/jobs/HAV/${unbilled}`, as: 'site_manager' },
    { name: 'hand-back', path: `/jobs/HAV/${rotten}/hand-back`, as: 'recorder' },
    { name: 'come-backs', path: '/come-backs', as: 'site_manager' },
    { name: 'come-backs-network', path: '/come-backs', as: 'head_office' },
    { name: 'come-backs-lead', path: '/come-backs?status=contacted', as: 'regional_lead' },
    { name: 'signals', path: '/signals', as: 'site_manager' },
    { name: 'signals-lead', path: '/signals', as: 'regional_lead' },
    { name: 'signals-network', path: '/signals?state=open', as: 'head_office' },
    { name: 'actions', path: '/actions', as: 'site_manager' },
    { name: 'actions-lead', path: '/actions', as: 'regional_lead' },
    { name: 'action-new', path: '/actions/new?branch=HAV', as: 'regional_lead' },
    { name: 'targets', path: '/targets', as: 'head_office' },
    { name: 'targets-lead', path: '/targets', as: 'regional_lead' },
    { name: 'quote', path: `/quote?${QUOTED}`, as: 'site_manager' },
    { name: 'quote-recorder', path: `/quote?${QUOTED}`, as: 'recorder' },
    { name: 'quote-empty', path: '/quote', as: 'site_manager' },
    { name: 'import', path: '/import', as: 'site_manager' },
    { name: 'import-network', path: '/import', as: 'head_office' },
    { name: 'how-it-is-counted', path: '/how-it-is-counted', as: 'site_manager' },
    { name: 'account', path: '/account', as: 'site_manager' },
    { name: 'mailbox', path: '/mailbox', as: 'head_office' },
    { name: 'set-up-network', path: '/set-up/network', as: 'head_office' },
    { name: 'set-up-regions', path: '/set-up/regions', as: 'head_office' },
    { name: 'set-up-region', path: '/set-up/regions/SOUND', as: 'head_office' },
    { name: 'set-up-branches', path: '/set-up/branches', as: 'head_office' },
    { name: 'set-up-branch', path: '/set-up/branches/HAV', as: 'head_office' },
    { name: 'set-up-products', path: '/set-up/products', as: 'head_office' },
    { name: 'set-up-product', path: '/set-up/products/CW1', as: 'head_office' },
    { name: 'set-up-consumables', path: '/set-up/consumables', as: 'head_office' },
    { name: 'set-up-packages', path: '/set-up/packages', as: 'head_office' },
    { name: 'set-up-package', path: '/set-up/packages/full', as: 'head_office' },
    { name: 'set-up-people', path: '/set-up/people', as: 'head_office' },
    { name: 'set-up-person', path: '/set-up/people/1', as: 'head_office' },
    { name: 'first-run', path: '/first-run', as: 'head_office' },
    { name: 'audit', path: '/audit', as: 'head_office' },
    { name: 'send', path: '/send', as: 'recorder' },
    { name: 'send-network', path: '/send?branch=HAV', as: 'head_office' },
    { name: 'voided', path: '/voided', as: 'site_manager' },
    { name: 'voided-network', path: '/voided', as: 'head_office' },
    { name: 'no-page', path: '/no-such-page', as: 'site_manager' },
  ];
}

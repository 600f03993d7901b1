import { inject, Injector } from '@angular/core';
import type { Routes } from '@angular/router';
import { homeOf } from './core/session/home';
import { forRoles, signedIn } from './core/session/role-guard';
import { Session } from './core/session/session';

const senders = forRoles('recorder', 'site_manager', 'head_office');
const managers = forRoles('site_manager', 'head_office');
const headOffice = forRoles('head_office');
const leads = forRoles('regional_lead', 'head_office');
const readers = forRoles('site_manager', 'regional_lead', 'head_office');

/**
 * The first page of whoever is signed in; whether a network has begun is asked for head office alone. Nobody has one: which it
 * is shows once they have signed in.
 */
async function home(): Promise<string> {
  const injector = inject(Injector);
  const role = inject(Session).role();
  if (!role) return '/sign-in';
  if (role !== 'head_office') return homeOf(role);
  const { firstPage } = await import('./core/session/first-page');
  return firstPage(injector);
}

/** Every page, each loaded when it is opened. */
export const routes: Routes = [
  {
    path: 'sign-in',
    title: 'Sign in',
    loadChildren: () => import('./features/sign-in/sign-in.routes'),
  },
  {
    path: 'welcome',
    title: 'Set a password',
    loadChildren: () => import('./features/welcome/welcome.routes'),
  },
  {
    path: 'unsubscribe',
    title: 'Stop a mail',
    loadChildren: () => import('./features/unsubscribe/unsubscribe.routes'),
  },
  {
    // A form for a phone in a workshop: without header and footer around it.
    path: 'send/:draft',
    title: 'Send a job',
    canActivate: [signedIn, senders],
    loadChildren: () => import('./features/send/draft.routes'),
  },
  {
    path: '',
    canActivate: [signedIn],
    loadComponent: () => import('./core/shell/shell').then((file) => file.Shell),
    children: [
      { path: '', pathMatch: 'full', redirectTo: home },
      {
        path: 'this-week',
        title: 'This week',
        canActivate: [readers],
        loadChildren: () => import('./features/this-week/this-week.routes'),
      },
      {
        path: 'overruns',
        title: 'Overruns',
        canActivate: [readers],
        loadChildren: () => import('./features/overruns/overruns.routes'),
      },
      {
        path: 'rot',
        title: 'Rot',
        canActivate: [readers],
        loadChildren: () => import('./features/rot/rot.routes'),
      },
      {
        path: 'product',
        title: 'Product',
        canActivate: [readers],
        loadChildren: () => import('./features/product/product.routes'),
      },
      {
        path: 'warranty',
        pathMatch: 'full',
        title: 'Warranty',
        canActivate: [readers],
        loadChildren: () => import('./features/warranty/warranty.routes'),
      },
      {
        path: 'warranty/reports',
        title: 'Warranty-risk report',
        canActivate: [headOffice],
        loadChildren: () => import('./features/warranty-report/warranty-report.routes'),
      },
      {
        path: 'claims',
        pathMatch: 'full',
        title: 'Claims',
        loadChildren: () => import('./features/claims/claims.routes'),
      },
      {
        path: 'claims/:branch/:claimRef',
        title: 'Claim',
        loadChildren: () => import('./features/claim/claim.routes'),
      },
      {
        path: 'jobs/:branch/:jobRef/claim',
        title: 'Record a claim',
        canActivate: [senders],
        loadChildren: () => import('./features/claim/new-claim.routes'),
      },
      {
        path: 'jobs',
        title: 'Jobs',
        loadChildren: () => import('./features/jobs/jobs.routes'),
      },
      {
        path: 'jobs/:branch/:jobRef',
        title: 'Job sheet',
        loadChildren: () => import('./features/job-sheet/job-sheet.routes'),
      },
      {
        path: 'jobs/:branch/:jobRef/hand-back',
        title: 'Hand-back sheet',
        loadChildren: () => import('./features/hand-back/hand-back.routes'),
      },
      {
        path: 'jobs/:branch/:jobRef/correct',
        title: 'Correct a job',
        canActivate: [senders],
        loadChildren: () => import('./features/send/correct.routes'),
      },
      {
        path: 'voided',
        title: 'Voided jobs',
        canActivate: [managers],
        loadChildren: () => import('./features/voided/voided.routes'),
      },
      {
        path: 'send',
        title: 'Send a job',
        canActivate: [senders],
        loadChildren: () => import('./features/send/send.routes'),
      },
      {
        path: 'import',
        title: 'Import',
        canActivate: [managers],
        loadChildren: () => import('./features/import/import.routes'),
      },
      {
        path: 'set-up',
        title: 'Set-up',
        canActivate: [headOffice],
        loadChildren: () => import('./features/set-up/set-up.routes'),
      },
      {
        path: 'audit',
        title: 'Audit trail',
        canActivate: [headOffice],
        loadChildren: () => import('./features/audit/audit.routes'),
      },
      {
        path: 'first-run',
        title: 'First steps',
        canActivate: [headOffice],
        loadChildren: () => import('./features/first-run/first-run.routes'),
      },
      {
        path: 'come-backs',
        title: 'Come-backs',
        canActivate: [readers],
        loadChildren: () => import('./features/come-backs/come-backs.routes'),
      },
      {
        path: 'branches',
        title: 'Branches',
        canActivate: [readers],
        loadChildren: () => import('./features/branches/branches.routes'),
      },
      {
        path: 'signals',
        title: 'Signals',
        canActivate: [readers],
        loadChildren: () => import('./features/signals/signals.routes'),
      },
      {
        path: 'actions',
        title: 'Actions',
        canActivate: [readers],
        loadChildren: () => import('./features/actions/actions.routes'),
      },
      {
        path: 'targets',
        title: 'Targets',
        canActivate: [leads],
        loadChildren: () => import('./features/targets/targets.routes'),
      },
      {
        path: 'quote',
        title: 'Quote',
        loadChildren: () => import('./features/quote/quote.routes'),
      },
      {
        path: 'how-it-is-counted',
        title: 'How it is counted',
        loadChildren: () => import('./features/how-it-is-counted/how-it-is-counted.routes'),
      },
      {
        path: 'account',
        title: 'Account',
        loadChildren: () => import('./features/account/account.routes'),
      },
      {
        path: 'mailbox',
        title: 'Mailbox',
        canActivate: [headOffice],
        loadChildren: () => import('./features/mailbox/mailbox.routes'),
      },
      {
        path: '**',
        title: 'Not found',
        loadComponent: () => import('./core/shell/not-found').then((file) => file.NotFound),
      },
    ],
  },
];

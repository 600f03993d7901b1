import type { Routes } from '@angular/router';
import { forRoles } from '../../core/session/role-guard';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { ActionPage } from './action-page';
import { ActionsPage } from './actions-page';
import { AgreePage } from './agree-page';

export default [
  { path: '', component: ActionsPage },
  {
    path: 'new',
    title: 'Agree an action',
    canActivate: [forRoles('regional_lead', 'head_office')],
    component: AgreePage,
    providers: [FIELD_DEFAULTS],
  },
  { path: ':branch/:id', title: 'Action', component: ActionPage, providers: [FIELD_DEFAULTS] },
] satisfies Routes;

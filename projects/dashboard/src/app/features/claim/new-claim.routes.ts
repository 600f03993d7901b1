import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { NewClaimPage } from './new-claim-page';

export default [
  { path: '', component: NewClaimPage, providers: [FIELD_DEFAULTS] },
] satisfies Routes;

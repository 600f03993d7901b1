import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { ClaimPage } from './claim-page';

export default [{ path: '', component: ClaimPage, providers: [FIELD_DEFAULTS] }] satisfies Routes;

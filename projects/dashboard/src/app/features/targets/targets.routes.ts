import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { TargetsPage } from './targets-page';

export default [{ path: '', component: TargetsPage, providers: [FIELD_DEFAULTS] }] satisfies Routes;

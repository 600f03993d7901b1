import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { FirstRunPage } from './first-run-page';

export default [
  { path: '', component: FirstRunPage, providers: [FIELD_DEFAULTS] },
] satisfies Routes;

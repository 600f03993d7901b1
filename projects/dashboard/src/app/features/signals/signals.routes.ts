import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { SignalsPage } from './signals-page';

export default [{ path: '', component: SignalsPage, providers: [FIELD_DEFAULTS] }] satisfies Routes;

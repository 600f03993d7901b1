import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { SendPage } from './send-page';

export default [{ path: '', component: SendPage, providers: [FIELD_DEFAULTS] }] satisfies Routes;

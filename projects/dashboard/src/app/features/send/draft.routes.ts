import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { DraftPage } from './draft-page';

export default [{ path: '', component: DraftPage, providers: [FIELD_DEFAULTS] }] satisfies Routes;

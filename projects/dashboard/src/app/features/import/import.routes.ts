import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { ImportPage } from './import-page';

export default [{ path: '', component: ImportPage, providers: [FIELD_DEFAULTS] }] satisfies Routes;

import type { Routes } from '@angular/router';
import { ImportPage } from './import-page';

export default [{ path: '', component: ImportPage }] satisfies Routes;

import type { Routes } from '@angular/router';
import { ReportsPage } from './reports-page';

export default [{ path: '', component: ReportsPage }] satisfies Routes;

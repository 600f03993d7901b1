import type { Routes } from '@angular/router';
import { TargetsPage } from './targets-page';

export default [{ path: '', component: TargetsPage }] satisfies Routes;

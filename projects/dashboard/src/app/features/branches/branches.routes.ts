import type { Routes } from '@angular/router';
import { BranchesPage } from './branches-page';

export default [{ path: '', component: BranchesPage }] satisfies Routes;

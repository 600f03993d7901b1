import type { Routes } from '@angular/router';
import { ActionsPage } from './actions-page';

export default [{ path: '', component: ActionsPage }] satisfies Routes;

import type { Routes } from '@angular/router';
import { FirstRunPage } from './first-run-page';

export default [{ path: '', component: FirstRunPage }] satisfies Routes;

import type { Routes } from '@angular/router';
import { VoidedPage } from './voided-page';

export default [{ path: '', component: VoidedPage }] satisfies Routes;

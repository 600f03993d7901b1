import type { Routes } from '@angular/router';
import { ClaimsPage } from './claims-page';

export default [{ path: '', component: ClaimsPage }] satisfies Routes;

import type { Routes } from '@angular/router';
import { ClaimPage } from './claim-page';

export default [{ path: '', component: ClaimPage }] satisfies Routes;

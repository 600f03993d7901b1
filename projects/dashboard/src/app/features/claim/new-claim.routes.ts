import type { Routes } from '@angular/router';
import { NewClaimPage } from './new-claim-page';

export default [{ path: '', component: NewClaimPage }] satisfies Routes;

import type { Routes } from '@angular/router';
import { SetUpPage } from './set-up-page';

export default [{ path: '', component: SetUpPage }] satisfies Routes;

import type { Routes } from '@angular/router';
import { SignalsPage } from './signals-page';

export default [{ path: '', component: SignalsPage }] satisfies Routes;

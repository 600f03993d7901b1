import type { Routes } from '@angular/router';
import { SendPage } from './send-page';

export default [{ path: '', component: SendPage }] satisfies Routes;

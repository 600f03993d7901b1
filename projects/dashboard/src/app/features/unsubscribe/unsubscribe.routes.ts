import type { Routes } from '@angular/router';
import { UnsubscribePage } from './unsubscribe-page';

export default [{ path: '', component: UnsubscribePage }] satisfies Routes;

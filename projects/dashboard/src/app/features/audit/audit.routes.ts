import type { Routes } from '@angular/router';
import { AuditPage } from './audit-page';

export default [{ path: '', component: AuditPage }] satisfies Routes;

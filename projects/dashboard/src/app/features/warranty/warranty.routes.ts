import type { Routes } from '@angular/router';
import { WarrantyPage } from './warranty-page';

export default [{ path: '', component: WarrantyPage }] satisfies Routes;

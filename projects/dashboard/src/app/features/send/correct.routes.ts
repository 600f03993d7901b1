import type { Routes } from '@angular/router';
import { CorrectPage } from './correct-page';

export default [{ path: '', component: CorrectPage }] satisfies Routes;

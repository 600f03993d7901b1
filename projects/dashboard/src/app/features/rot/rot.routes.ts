import type { Routes } from '@angular/router';
import { RotPage } from './rot-page';

const routes: Routes = [{ path: '', component: RotPage }];
export default routes;

import type { Routes } from '@angular/router';
import { HandBackPage } from './hand-back-page';

const routes: Routes = [{ path: '', component: HandBackPage }];
export default routes;

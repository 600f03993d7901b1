import type { Routes } from '@angular/router';
import { ThisWeekPage } from './this-week-page';

const routes: Routes = [{ path: '', component: ThisWeekPage }];
export default routes;

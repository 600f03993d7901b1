import type { Routes } from '@angular/router';
import { JobsPage } from './jobs-page';

const routes: Routes = [{ path: '', component: JobsPage }];
export default routes;

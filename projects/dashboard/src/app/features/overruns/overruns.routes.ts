import type { Routes } from '@angular/router';
import { OverrunsPage } from './overruns-page';

const routes: Routes = [{ path: '', component: OverrunsPage }];
export default routes;

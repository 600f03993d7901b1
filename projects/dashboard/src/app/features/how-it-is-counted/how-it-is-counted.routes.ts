import type { Routes } from '@angular/router';
import { HowItIsCountedPage } from './how-it-is-counted-page';

const routes: Routes = [{ path: '', component: HowItIsCountedPage }];
export default routes;

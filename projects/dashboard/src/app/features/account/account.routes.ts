import type { Routes } from '@angular/router';
import { AccountPage } from './account-page';

const routes: Routes = [{ path: '', component: AccountPage }];
export default routes;

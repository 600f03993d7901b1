import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { AccountPage } from './account-page';

const routes: Routes = [{ path: '', component: AccountPage, providers: [FIELD_DEFAULTS] }];
export default routes;

import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { ComeBacksPage } from './come-backs-page';

const routes: Routes = [{ path: '', component: ComeBacksPage, providers: [FIELD_DEFAULTS] }];
export default routes;

import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { ThisWeekPage } from './this-week-page';

const routes: Routes = [{ path: '', component: ThisWeekPage, providers: [FIELD_DEFAULTS] }];
export default routes;

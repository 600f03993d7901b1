import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { WelcomePage } from './welcome-page';

const routes: Routes = [{ path: '', component: WelcomePage, providers: [FIELD_DEFAULTS] }];
export default routes;

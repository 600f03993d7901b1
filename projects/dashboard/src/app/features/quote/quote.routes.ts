import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { QuotePage } from './quote-page';

const routes: Routes = [{ path: '', component: QuotePage, providers: [FIELD_DEFAULTS] }];
export default routes;

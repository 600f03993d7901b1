import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { JobSheetPage } from './job-sheet-page';

const routes: Routes = [{ path: '', component: JobSheetPage, providers: [FIELD_DEFAULTS] }];
export default routes;

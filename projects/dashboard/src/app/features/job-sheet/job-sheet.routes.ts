import type { Routes } from '@angular/router';
import { JobSheetPage } from './job-sheet-page';

const routes: Routes = [{ path: '', component: JobSheetPage }];
export default routes;

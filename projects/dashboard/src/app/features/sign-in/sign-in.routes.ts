import type { Routes } from '@angular/router';

const routes: Routes = [];
export default routes;

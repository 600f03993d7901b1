import type { Routes } from '@angular/router';
import { ProductPage } from './product-page';

const routes: Routes = [{ path: '', component: ProductPage }];
export default routes;

import type { Routes } from '@angular/router';
import { WelcomePage } from './welcome-page';

const routes: Routes = [{ path: '', component: WelcomePage }];
export default routes;

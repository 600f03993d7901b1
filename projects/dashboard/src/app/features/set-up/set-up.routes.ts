import type { Routes } from '@angular/router';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { BranchPage } from './branch-page';
import { BranchesPage } from './branches-page';
import { ConsumablesPage } from './consumables-page';
import { NetworkPage } from './network-page';
import { PackagePage } from './package-page';
import { PackagesPage } from './packages-page';
import { PeoplePage } from './people-page';
import { PersonPage } from './person-page';
import { ProductSetUpPage } from './product-page';
import { ProductsPage } from './products-page';
import { RegionPage } from './region-page';
import { RegionsPage } from './regions-page';
import { SetUpFrame } from './set-up-frame';

const routes: Routes = [
  {
    path: '',
    component: SetUpFrame,
    providers: [FIELD_DEFAULTS],
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'network' },
      { path: 'network', title: 'Set-up, network and fee', component: NetworkPage },
      { path: 'regions', title: 'Set-up, regions', component: RegionsPage },
      { path: 'regions/:code', title: 'Set-up, a region', component: RegionPage },
      { path: 'branches', title: 'Set-up, branches', component: BranchesPage },
      { path: 'branches/:code', title: 'Set-up, a branch', component: BranchPage },
      { path: 'products', title: 'Set-up, products', component: ProductsPage },
      { path: 'products/:code', title: 'Set-up, a product', component: ProductSetUpPage },
      { path: 'consumables', title: 'Set-up, consumables', component: ConsumablesPage },
      { path: 'packages', title: 'Set-up, packages and norms', component: PackagesPage },
      { path: 'packages/:code', title: 'Set-up, a package', component: PackagePage },
      { path: 'people', title: 'Set-up, people', component: PeoplePage },
      { path: 'people/:id', title: 'Set-up, a person', component: PersonPage },
    ],
  },
];
export default routes;

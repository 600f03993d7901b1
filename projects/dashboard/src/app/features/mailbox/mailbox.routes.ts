import type { Routes } from '@angular/router';
import { MailboxPage } from './mailbox-page';

const routes: Routes = [{ path: '', component: MailboxPage }];
export default routes;

import { inject } from '@angular/core';
import { type CanActivateFn, Router, type Routes } from '@angular/router';
import { homeOf } from '../../core/session/home';
import { Session } from '../../core/session/session';
import { FIELD_DEFAULTS } from '../../ui/field-defaults';
import { ForgotPage } from './forgot-page';
import { SignInPage } from './sign-in-page';

/** Who is signed in already goes to their first page. */
const notSignedIn: CanActivateFn = () => {
  const session = inject(Session);
  return session.person() ? inject(Router).createUrlTree([homeOf(session.role())]) : true;
};

const routes: Routes = [
  { path: '', component: SignInPage, canActivate: [notSignedIn], providers: [FIELD_DEFAULTS] },
  { path: 'forgot', title: 'A new password', component: ForgotPage, providers: [FIELD_DEFAULTS] },
];
export default routes;

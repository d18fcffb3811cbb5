import { type Routes } from '@angular/router';
import { FailedPage } from './shell/failed-page';
import { signedIn } from './shell/signed-in-guard';

/** Every page is a lazy feature. `title` is what the window and the announcement say; "· Stillpier" is added. */
export const routes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'rigs' },
  {
    path: 'sign-in',
    title: 'Sign in',
    loadComponent: () => import('./sign-in/sign-in-page').then((m) => m.SignInPage),
  },
  {
    path: 'sign-up',
    title: 'Make an account',
    loadComponent: () => import('./sign-in/sign-up-page').then((m) => m.SignUpPage),
  },
  {
    path: 'confirm',
    title: 'Confirm your address',
    loadComponent: () => import('./sign-in/confirm-page').then((m) => m.ConfirmPage),
  },
  {
    path: 'forgot-password',
    title: 'Forgot the password',
    loadComponent: () => import('./sign-in/forgot-password-page').then((m) => m.ForgotPasswordPage),
  },
  {
    path: 'reset-password',
    title: 'Set a new password',
    loadComponent: () => import('./sign-in/reset-password-page').then((m) => m.ResetPasswordPage),
  },
  { path: 'failed', title: 'Not loaded', component: FailedPage },
  {
    path: '',
    canActivate: [signedIn],
    children: [
      // Pages of a rig stand here; `rigs` below takes what is left.
      {
        path: 'rigs/:rigId/nights',
        loadChildren: () => import('./nights/nights-routes').then((m) => m.nightsRoutes),
      },
      {
        path: 'rigs/:rigId/import',
        loadChildren: () => import('./import/import-routes').then((m) => m.importRoutes),
      },
      {
        path: 'rigs',
        loadChildren: () => import('./rigs/rigs-routes').then((m) => m.rigsRoutes),
      },
      {
        path: 'account',
        title: 'Account',
        loadComponent: () => import('./account/account-page').then((m) => m.AccountPage),
      },
      {
        path: '**',
        title: 'Page not found',
        loadComponent: () => import('./shell/not-found-page').then((m) => m.NotFoundPage),
      },
    ],
  },
];

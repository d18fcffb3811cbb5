import { type Routes } from '@angular/router';
import { signedIn } from './shell/signed-in-guard';

/** Every page is a lazy feature. `title` is what the window and the announcement say; "· Stillpier" is added. */
export const routes: Routes = [
  { path: '', pathMatch: 'full', redirectTo: 'rigs' },
  {
    path: '',
    canActivate: [signedIn],
    children: [
      {
        path: 'rigs',
        title: 'Rigs',
        loadComponent: () => import('./rigs/rigs-page').then((m) => m.RigsPage),
      },
    ],
  },
  {
    path: '**',
    title: 'Page not found',
    loadComponent: () => import('./shell/not-found-page').then((m) => m.NotFoundPage),
  },
];

import { type Routes } from '@angular/router';

export const rigsRoutes: Routes = [
  {
    path: '',
    pathMatch: 'full',
    title: 'Rigs',
    loadComponent: () => import('./rigs-page').then((m) => m.RigsPage),
  },
];

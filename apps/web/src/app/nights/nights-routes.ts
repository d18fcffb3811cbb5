import { type Routes } from '@angular/router';
import { NightsPage } from './nights-page';

/** Under rigs/:rigId/nights. The night page brings the charts: its own chunk. */
export const nightsRoutes: Routes = [
  { path: '', pathMatch: 'full', title: 'Nights', component: NightsPage },
  {
    path: ':date',
    title: 'Night',
    loadComponent: () => import('../night/night-page').then((m) => m.NightPage),
  },
];

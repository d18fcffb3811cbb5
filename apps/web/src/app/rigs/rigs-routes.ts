import { type Routes } from '@angular/router';
import { keepEdits } from '../form/keep-edits-guard';
import { SetupPage } from '../setups/setup-page';
import { NewRigPage } from './new-rig-page';
import { RigSettingsPage } from './rig-settings-page';
import { RigsPage } from './rigs-page';

/** The rigs of an account, and what describes a rig. */
export const rigsRoutes: Routes = [
  { path: '', pathMatch: 'full', title: 'Rigs', component: RigsPage },
  { path: 'new', title: 'New rig', component: NewRigPage, canDeactivate: [keepEdits] },
  { path: ':rigId', pathMatch: 'full', redirectTo: '/rigs/:rigId/nights' },
  {
    path: ':rigId/settings',
    title: 'Rig settings',
    component: RigSettingsPage,
    canDeactivate: [keepEdits],
  },
  {
    path: ':rigId/setups/new',
    title: 'New setup',
    component: SetupPage,
    canDeactivate: [keepEdits],
  },
  {
    path: ':rigId/setups/:setupId',
    title: 'Setup',
    component: SetupPage,
    canDeactivate: [keepEdits],
  },
];

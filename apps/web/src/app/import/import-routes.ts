import { type Routes } from '@angular/router';
import { ImportPage } from './import-page';
import { LogPage } from './log-page';
import { stayWhileSending } from './stay-while-sending';

/** Under rigs/:rigId/import. */
export const importRoutes: Routes = [
  { path: '', title: 'Add logs', component: ImportPage, canDeactivate: [stayWhileSending] },
  { path: ':importId', title: 'Log', component: LogPage },
];

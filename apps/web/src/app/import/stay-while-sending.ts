import { inject } from '@angular/core';
import { type CanDeactivateFn } from '@angular/router';
import { Questions } from '../form/questions';
import type { ImportPage } from './import-page';

/** Leaving breaks off what is being sent: the page asks first. It also warns when the window is closed. */
export const stayWhileSending: CanDeactivateFn<ImportPage> = (page) =>
  !page.isSending() ||
  inject(Questions).ask({
    title: 'Break off the upload?',
    text: 'A file is still being sent. Files that have arrived are read whether you stay or not.',
    yes: 'Break off and leave',
    no: 'Stay on the page',
  });

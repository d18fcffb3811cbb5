import { inject } from '@angular/core';
import { type CanDeactivateFn } from '@angular/router';
import { Questions } from './questions';

/** A page with a form that may hold what is not saved. It also warns when the window is closed. */
export interface HoldsEdits {
  hasUnsavedEdits(): boolean;
}

export const keepEdits: CanDeactivateFn<HoldsEdits> = (page) =>
  !page.hasUnsavedEdits() ||
  inject(Questions).ask({
    title: 'Leave without saving?',
    text: 'What you changed on this page is not saved yet.',
    yes: 'Leave without saving',
    no: 'Stay on the page',
  });

import { inject, Injectable } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router } from '@angular/router';
import { sentenceOf } from '../api/problem-error';
import { SessionApi } from '../api/session-api';

/** Ends the session and leads to the sign-in page; says so when the session could not be ended. */
@Injectable({ providedIn: 'root' })
export class SignOut {
  private readonly router = inject(Router);
  private readonly session = inject(SessionApi);
  private readonly snackBar = inject(MatSnackBar);

  async now(): Promise<void> {
    try {
      await this.session.signOut();
      await this.router.navigate(['/sign-in']);
    } catch (error) {
      // The server may be out of reach: the person must know that the session is still open.
      this.snackBar.open(`You are still signed in. ${sentenceOf(error)}`, 'Close');
    }
  }
}

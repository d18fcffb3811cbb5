import { inject } from '@angular/core';
import { ActivatedRoute } from '@angular/router';

/** The token of the link in an e-mail: behind `#`, so that it reaches neither a log nor another site. */
export function mailToken(): string {
  return new URLSearchParams(inject(ActivatedRoute).snapshot.fragment ?? '').get('token') ?? '';
}

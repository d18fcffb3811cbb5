import { inject } from '@angular/core';
import { ActivatedRoute } from '@angular/router';
import { confirmAccountSchema } from '@stillpier/contract';

/**
 * The token of the link in an e-mail: behind `#`, so that it reaches neither a log nor another site.
 * @returns '' when the link was cut short on its way here.
 */
export function mailToken(): string {
  const token = new URLSearchParams(inject(ActivatedRoute).snapshot.fragment ?? '').get('token');
  return confirmAccountSchema.safeParse({ token }).data?.token ?? '';
}

import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';

@Component({
  selector: 'app-not-found-page',
  imports: [MatButton, RouterLink],
  template: `
    <p class="folio"><b>Not found</b></p>
    <h1 class="sentence">There is no page at this address, or it is not shared with you.</h1>
    <p class="actions"><a matButton="filled" routerLink="/rigs">Go to your rigs</a></p>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NotFoundPage {}

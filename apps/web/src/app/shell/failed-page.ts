import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';

/** When a page cannot be started: its code does not come, or the server does not say who is signed in. */
@Component({
  selector: 'app-failed-page',
  imports: [MatButton],
  template: `
    <p class="folio"><b>Not loaded</b></p>
    <h1 class="sentence">This page could not be loaded, because the server did not answer.</h1>
    <p class="lede">
      Check the connection, then load the page again. Nothing that was saved is lost.
    </p>
    <p class="actions">
      <a matButton="filled" [href]="address">Load again</a>
    </p>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FailedPage {
  /** Not a router link: the whole application is to be fetched anew. */
  protected readonly address = location.href;
}

import { Clipboard } from '@angular/cdk/clipboard';
import {
  ChangeDetectionStrategy,
  Component,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { NewAccessToken } from '@stillpier/contract';

/** A token that was just made: the one time that it is seen. */
@Component({
  selector: 'app-new-token',
  imports: [MatButton],
  template: `
    <p>
      <b>{{ token().name }}</b> is made. Copy the token now: it is shown this once and kept nowhere
      in clear.
    </p>
    <code tabindex="0" aria-label="The token">{{ token().token }}</code>
    <p class="actions">
      <button matButton="filled" type="button" (click)="copy()">Copy the token</button>
      <button matButton="text" type="button" (click)="done.emit()">Done, hide it</button>
      <span role="status">{{ said() }}</span>
    </p>
  `,
  styles: `
    :host {
      display: block;
      margin-bottom: 24px;
      padding: 14px 0 18px;
      border-block: 1px solid var(--ink);
    }
    code {
      display: block;
      margin-top: 10px;
      padding: 10px 12px;
      background: var(--paper-sunk);
      font: 400 14px/22px var(--mono);
      overflow-wrap: anywhere;
    }
    .actions {
      margin-top: 14px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NewToken {
  private readonly clipboard = inject(Clipboard);

  readonly token = input.required<NewAccessToken>();
  readonly done = output();

  protected readonly said = linkedSignal({ source: this.token, computation: () => '' });

  protected copy(): void {
    this.said.set(
      this.clipboard.copy(this.token().token)
        ? 'Copied.'
        : 'The browser did not copy it: select the token and copy it by hand.',
    );
  }
}

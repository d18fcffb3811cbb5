import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { AccountsApi } from '../api/accounts-api';
import { sentenceOf } from '../api/problem-error';
import { FrontPage } from './front-page';
import { mailToken } from './mail-token';

/** Where the link of the first e-mail leads. A button sends the token: programs that look into mail open links too. */
@Component({
  selector: 'app-confirm-page',
  imports: [FrontPage, MatButton, RouterLink],
  templateUrl: './confirm-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ConfirmPage {
  private readonly accounts = inject(AccountsApi);

  protected readonly token = mailToken();
  protected readonly state = signal<'open' | 'busy' | 'confirmed'>('open');
  protected readonly refusal = signal<string | null>(null);

  protected async confirm(): Promise<void> {
    this.state.set('busy');
    this.refusal.set(null);
    try {
      await this.accounts.confirm({ token: this.token });
      this.state.set('confirmed');
    } catch (error) {
      // An old or used link is an answer for the person, not a fault of the page.
      this.refusal.set(sentenceOf(error));
      this.state.set('open');
    }
  }
}

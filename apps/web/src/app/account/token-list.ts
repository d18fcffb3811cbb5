import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, inject, signal } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { type AccessToken, importPaths, type NewAccessToken } from '@stillpier/contract';
import { AccessTokensApi } from '../api/access-tokens-api';
import { sentenceOf } from '../api/problem-error';
import { RigsApi } from '../api/rigs-api';
import { Questions } from '../form/questions';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { NewToken } from './new-token';
import { TokenForm } from './token-form';
import { MAIL_CHOICES, scopeWord } from './token-words';

/** The tokens that the account gave to its programs. */
@Component({
  selector: 'app-token-list',
  imports: [DatePipe, Failure, NewToken, TokenForm, Waiting],
  templateUrl: './token-list.html',
  styleUrl: './token-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TokenList {
  private readonly accessTokensApi = inject(AccessTokensApi);
  private readonly questions = inject(Questions);
  private readonly snackBar = inject(MatSnackBar);
  private readonly rigs = inject(RigsApi).list;

  protected readonly tokens = this.accessTokensApi.list();
  protected readonly fresh = signal<NewAccessToken | null>(null);
  protected readonly mails = MAIL_CHOICES;
  protected readonly scopeWord = scopeWord;

  /** The request that sends a log, for each rig of the account. */
  protected readonly addresses = computed(() =>
    (this.rigs.hasValue() ? this.rigs.value() : []).map(({ id, name }) => ({
      name,
      address: `${location.origin}${importPaths.all(id)}`,
    })),
  );

  protected show(token: NewAccessToken): void {
    this.fresh.set(token);
    this.tokens.reload();
  }

  protected hasExpired({ expiresAt }: AccessToken): boolean {
    return Date.parse(expiresAt) <= Date.now();
  }

  protected async changeMails(token: AccessToken, event: Event): Promise<void> {
    if (!(event.target instanceof HTMLSelectElement)) return;
    const wanted = event.target.value;
    const mails = MAIL_CHOICES.find(({ value }) => value === wanted)?.value;
    if (!mails) return;
    try {
      await this.accessTokensApi.update(token, { mails });
    } catch (error) {
      this.snackBar.open(`The choice is not saved. ${sentenceOf(error)}`, 'Close');
    }
    this.tokens.reload();
  }

  protected async revoke(token: AccessToken): Promise<void> {
    const sure = await this.questions.ask({
      title: `Revoke the token ${token.name}?`,
      text: 'A program that uses it is refused from now on. What it has sent stays.',
      yes: 'Revoke it',
      no: 'Keep it',
    });
    if (!sure) return;
    try {
      await this.accessTokensApi.revoke(token);
      if (this.fresh()?.id === token.id) this.fresh.set(null);
    } catch (error) {
      // Nothing on the page shows this: the token is still in the list.
      this.snackBar.open(`The token is not revoked. ${sentenceOf(error)}`, 'Close');
    }
    this.tokens.reload();
  }
}

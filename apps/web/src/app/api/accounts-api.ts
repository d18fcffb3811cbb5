import { HttpClient } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import {
  accountPaths,
  accountSchema,
  type ChangePassword,
  type ConfirmAccount,
  type MailSent,
  mailSentSchema,
  type RenameAccount,
  type RequestPasswordReset,
  type ResetPassword,
  type SignUp,
} from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';
import { SessionApi } from './session-api';

@Injectable({ providedIn: 'root' })
export class AccountsApi {
  private readonly http = inject(HttpClient);
  private readonly session = inject(SessionApi);

  async signUp(body: SignUp): Promise<MailSent> {
    return mailSentSchema.parse(await firstValueFrom(this.http.post(accountPaths.accounts, body)));
  }

  async confirm(body: ConfirmAccount): Promise<void> {
    await firstValueFrom(this.http.post(accountPaths.confirmations, body));
  }

  async requestPasswordReset(body: RequestPasswordReset): Promise<MailSent> {
    const answer = await firstValueFrom(this.http.post(accountPaths.passwordResets, body));
    return mailSentSchema.parse(answer);
  }

  async resetPassword(body: ResetPassword): Promise<void> {
    await firstValueFrom(this.http.put(accountPaths.passwordResets, body));
  }

  async rename(body: RenameAccount): Promise<void> {
    const answer = await firstValueFrom(this.http.patch(accountPaths.account, body));
    this.session.changed(accountSchema.parse(answer));
  }

  async changePassword(body: ChangePassword): Promise<void> {
    await firstValueFrom(this.http.put(accountPaths.password, body));
  }
}

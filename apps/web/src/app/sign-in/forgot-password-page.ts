import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { type MailSent, requestPasswordResetSchema } from '@stillpier/contract';
import { AccountsApi } from '../api/accounts-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { FrontPage } from './front-page';
import { MailOnItsWay } from './mail-on-its-way';

@Component({
  selector: 'app-forgot-password-page',
  imports: [
    Field,
    FieldInput,
    FormMessage,
    FrontPage,
    MailOnItsWay,
    MatButton,
    ReactiveFormsModule,
    RouterLink,
  ],
  template: `
    <app-front-page>
      @if (sent(); as answer) {
        <div class="stack" role="status">
          <h1 class="form-title">Now look at your mail</h1>
          <app-mail-on-its-way [sent]="answer" />
          <p class="small apart"><a routerLink="/sign-in">Back to sign in</a></p>
        </div>
      } @else {
        <form class="stack" [formGroup]="form" (ngSubmit)="request()" novalidate>
          <h1 class="form-title">Forgot the password</h1>
          <p>You get a mail with a link, and set a new password there.</p>
          <app-field label="Email" [control]="form.controls.email">
            <input appFieldInput type="email" autocomplete="username" formControlName="email" />
          </app-field>
          <app-form-message [submission]="submission" />
          <button matButton="filled" type="submit" [disabled]="submission.busy()">
            Send the link
          </button>
          <p class="small apart"><a routerLink="/sign-in">Back to sign in</a></p>
        </form>
      }
    </app-front-page>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ForgotPasswordPage {
  private readonly accounts = inject(AccountsApi);

  protected readonly submission = new FormSubmission();
  protected readonly form = inject(NonNullableFormBuilder).group({ email: '' });
  protected readonly sent = signal<MailSent | null>(null);

  protected async request(): Promise<void> {
    await this.submission.send(this.form, requestPasswordResetSchema, async (body) => {
      this.sent.set(await this.accounts.requestPasswordReset(body));
    });
  }
}

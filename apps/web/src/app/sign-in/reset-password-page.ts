import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { resetPasswordSchema } from '@stillpier/contract';
import { AccountsApi } from '../api/accounts-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { FrontPage } from './front-page';
import { mailToken } from './mail-token';

/** Where the link of the reset e-mail leads. */
@Component({
  selector: 'app-reset-password-page',
  imports: [Field, FieldInput, FormMessage, FrontPage, MatButton, ReactiveFormsModule, RouterLink],
  templateUrl: './reset-password-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ResetPasswordPage {
  private readonly accounts = inject(AccountsApi);

  protected readonly submission = new FormSubmission();
  protected readonly form = inject(NonNullableFormBuilder).group({
    token: mailToken(),
    password: '',
  });
  protected readonly done = signal(false);

  protected async reset(): Promise<void> {
    const accepted = await this.submission.send(this.form, resetPasswordSchema, (body) =>
      this.accounts.resetPassword(body),
    );
    this.done.set(accepted);
  }
}

import { ChangeDetectionStrategy, Component, inject, signal } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { type MailSent, signUpSchema } from '@stillpier/contract';
import { AccountsApi } from '../api/accounts-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { FrontPage } from './front-page';
import { MailOnItsWay } from './mail-on-its-way';

@Component({
  selector: 'app-sign-up-page',
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
  templateUrl: './sign-up-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignUpPage {
  private readonly accounts = inject(AccountsApi);

  protected readonly submission = new FormSubmission();
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: '',
    email: '',
    password: '',
  });
  /** What the server said once the mail was on its way. */
  protected readonly sent = signal<MailSent | null>(null);

  protected async signUp(): Promise<void> {
    await this.submission.send(this.form, signUpSchema, async (body) => {
      this.sent.set(await this.accounts.signUp(body));
    });
  }
}

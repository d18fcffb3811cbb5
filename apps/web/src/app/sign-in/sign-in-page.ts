import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { Router, RouterLink } from '@angular/router';
import { signInSchema } from '@stillpier/contract';
import { SessionApi } from '../api/session-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { FrontPage } from './front-page';

@Component({
  selector: 'app-sign-in-page',
  imports: [Field, FieldInput, FormMessage, FrontPage, MatButton, ReactiveFormsModule, RouterLink],
  templateUrl: './sign-in-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SignInPage {
  private readonly session = inject(SessionApi);
  private readonly router = inject(Router);

  /** Query parameter: the page that asked for an account. */
  readonly returnTo = input<string>();

  protected readonly submission = new FormSubmission();
  protected readonly form = inject(NonNullableFormBuilder).group({
    email: '',
    password: '',
    stay: false,
  });

  protected async signIn(): Promise<void> {
    const accepted = await this.submission.send(this.form, signInSchema, (body) =>
      this.session.signIn(body),
    );
    if (accepted) await this.router.navigateByUrl(ownPath(this.returnTo()));
  }
}

/** Only a path of this application: a link must not lead elsewhere after the sign-in. */
function ownPath(path: string | undefined): string {
  return path?.startsWith('/') === true && !path.startsWith('//') ? path : '/rigs';
}

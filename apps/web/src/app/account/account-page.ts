import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { changePasswordSchema, renameAccountSchema } from '@stillpier/contract';
import { AccountsApi } from '../api/accounts-api';
import { SessionApi } from '../api/session-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { ColumnMapList } from '../rigs/column-map-list';
import { SignOut } from '../shell/sign-out';
import { TokenList } from './token-list';

@Component({
  selector: 'app-account-page',
  imports: [
    ColumnMapList,
    DatePipe,
    Field,
    FieldInput,
    FormMessage,
    MatButton,
    ReactiveFormsModule,
    TokenList,
  ],
  templateUrl: './account-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled' },
})
export class AccountPage {
  private readonly accounts = inject(AccountsApi);
  private readonly snackBar = inject(MatSnackBar);
  private readonly builder = inject(NonNullableFormBuilder);

  protected readonly signOut = inject(SignOut);
  protected readonly account = inject(SessionApi).account;

  protected readonly renaming = new FormSubmission();
  protected readonly nameForm = this.builder.group({ name: this.account()?.name ?? '' });

  protected readonly changing = new FormSubmission();
  protected readonly passwordForm = this.builder.group({ currentPassword: '', newPassword: '' });

  protected async rename(): Promise<void> {
    const accepted = await this.renaming.send(this.nameForm, renameAccountSchema, (body) =>
      this.accounts.rename(body),
    );
    if (accepted) this.snackBar.open('The name is saved.');
  }

  protected async changePassword(): Promise<void> {
    const accepted = await this.changing.send(this.passwordForm, changePasswordSchema, (body) =>
      this.accounts.changePassword(body),
    );
    if (!accepted) return;
    this.passwordForm.reset();
    this.snackBar.open('The new password holds. Other devices have been signed out.');
  }
}

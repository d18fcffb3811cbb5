import { ChangeDetectionStrategy, Component, inject, output } from '@angular/core';
import { NonNullableFormBuilder, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { createAccessTokenSchema, type NewAccessToken } from '@stillpier/contract';
import * as z from 'zod';
import { AccessTokensApi } from '../api/access-tokens-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { MAIL_CHOICES, SCOPE_CHOICES } from './token-words';

const USUAL_LIFE_DAYS = 90;

/** The form asks for the last day; the server takes the instant at its end. */
const formSchema = createAccessTokenSchema.extend({ expiresAt: z.iso.date('needs a day') });

/** Makes a token for a program. */
@Component({
  selector: 'app-token-form',
  imports: [Field, FieldInput, FormMessage, MatButton, ReactiveFormsModule],
  templateUrl: './token-form.html',
  styles: `
    // Its sign is white in every theme; the field can be typed into.
    :host-context(.theme-red) input::-webkit-calendar-picker-indicator {
      display: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TokenForm {
  private readonly accessTokensApi = inject(AccessTokensApi);

  readonly made = output<NewAccessToken>();

  protected readonly scopes = SCOPE_CHOICES;
  protected readonly mails = MAIL_CHOICES;
  protected readonly submission = new FormSubmission();
  protected readonly form = inject(NonNullableFormBuilder).group({
    name: '',
    scope: 'upload',
    expiresAt: dayFromNow(USUAL_LIFE_DAYS),
    mails: 'failed',
  });

  protected async make(): Promise<void> {
    await this.submission.send(this.form, formSchema, async ({ expiresAt, ...token }) => {
      const body = { ...token, expiresAt: endOfDay(expiresAt) };
      this.made.emit(await this.accessTokensApi.create(body));
      this.form.controls.name.reset();
    });
  }
}

/** As a date field takes it, by the clock of the device. */
function dayFromNow(days: number): string {
  const day = new Date();
  day.setDate(day.getDate() + days);
  const twoDigits = (n: number): string => String(n).padStart(2, '0');
  return `${day.getFullYear()}-${twoDigits(day.getMonth() + 1)}-${twoDigits(day.getDate())}`;
}

function endOfDay(date: string): string {
  return new Date(`${date}T23:59:59`).toISOString();
}

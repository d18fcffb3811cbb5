import * as z from 'zod';

export const ACCOUNT_KINDS = ['member', 'steward'] as const;

export const emailSchema = z
  .email('needs an address such as name@example.org')
  .max(254)
  .transform((email) => email.toLowerCase());
/** bcrypt reads 72 bytes: a longer password would be cut silently. */
export const passwordSchema = z
  .string()
  .min(10, 'needs at least 10 characters')
  .refine((text) => new TextEncoder().encode(text).length <= 72, 'may have at most 72 bytes');

export const accountSchema = z
  .strictObject({
    id: z.uuid(),
    email: z.string(),
    name: z.string(),
    kind: z.enum(ACCOUNT_KINDS),
    createdAt: z.iso.datetime(),
  })
  .meta({ id: 'Account' });
export type Account = z.infer<typeof accountSchema>;

export const signUpSchema = z.strictObject({
  email: emailSchema,
  name: z.string().trim().min(1, 'needs a name').max(80),
  password: passwordSchema,
});
export type SignUp = z.input<typeof signUpSchema>;

/** Answered alike whether the address is known or not. */
export const mailSentSchema = z
  .strictObject({
    message: z.string(),
    localMailUrl: z
      .url()
      .nullable()
      .describe('Where this installation shows its e-mails; null when they leave the machine'),
  })
  .meta({ id: 'MailSent' });
export type MailSent = z.infer<typeof mailSentSchema>;

const mailTokenSchema = z.string().min(20).max(100).describe('From the link in the e-mail');

export const confirmAccountSchema = z.strictObject({ token: mailTokenSchema });
export type ConfirmAccount = z.infer<typeof confirmAccountSchema>;

export const signInSchema = z.strictObject({
  email: emailSchema,
  password: z.string().min(1, 'needs the password').max(200),
  stay: z.boolean().default(false).describe('Whether to stay signed in for 30 days'),
});
export type SignIn = z.input<typeof signInSchema>;

export const sessionSchema = z
  .strictObject({ account: accountSchema.nullable() })
  .meta({ id: 'Session' });
export type Session = z.infer<typeof sessionSchema>;

export const requestPasswordResetSchema = z.strictObject({ email: emailSchema });
export type RequestPasswordReset = z.input<typeof requestPasswordResetSchema>;

export const resetPasswordSchema = z.strictObject({
  token: mailTokenSchema,
  password: passwordSchema,
});
export type ResetPassword = z.infer<typeof resetPasswordSchema>;

export const renameAccountSchema = z.strictObject({ name: signUpSchema.shape.name });
export type RenameAccount = z.infer<typeof renameAccountSchema>;

export const changePasswordSchema = z.strictObject({
  currentPassword: z.string().min(1, 'needs the current password').max(200),
  newPassword: passwordSchema,
});
export type ChangePassword = z.infer<typeof changePasswordSchema>;

export const accountPaths = {
  /** POST signUpSchema: 202 MailSent. */
  accounts: '/api/v1/accounts',
  /** POST confirmAccountSchema: 201 Account, which may sign in from now on. */
  confirmations: '/api/v1/accounts/confirmations',
  /** GET: 200 Session; POST signInSchema: 200 Session; DELETE: 204. */
  session: '/api/v1/session',
  /** GET: 200 Account; PATCH renameAccountSchema: 200 Account. */
  account: '/api/v1/account',
  /** PUT changePasswordSchema: 204, and the other sessions of the account end. */
  password: '/api/v1/account/password',
  /** POST requestPasswordResetSchema: 202 MailSent; PUT resetPasswordSchema: 204. */
  passwordResets: '/api/v1/password-resets',
} as const;

/** Pages of the client that e-mails lead to. A token behind `#` reaches neither log nor Referer. */
export const accountPages = {
  signIn: '/sign-in',
  confirm: (token: string) => `/confirm#token=${token}`,
  resetPassword: (token: string) => `/reset-password#token=${token}`,
} as const;

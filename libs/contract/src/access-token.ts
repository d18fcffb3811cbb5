import * as z from 'zod';

/** What a token may do: send logs and ask what becomes of them, or see what the account may see. */
export const TOKEN_SCOPES = ['upload', 'read'] as const;
/** When an e-mail tells what became of a log that came by the token. */
export const TOKEN_MAILS = ['failed', 'always'] as const;

const accessTokenFields = {
  name: z.string().trim().min(1, 'needs a name').max(80),
  scope: z.enum(TOKEN_SCOPES),
  expiresAt: z.iso.datetime(),
  mails: z.enum(TOKEN_MAILS).describe('About logs sent by it: those that failed, or all'),
};

export const accessTokenSchema = z
  .strictObject({
    ...accessTokenFields,
    id: z.uuid(),
    lastUsedAt: z.iso.datetime().nullable().describe('To the minute'),
    createdAt: z.iso.datetime(),
  })
  .meta({ id: 'AccessToken' });
export type AccessToken = z.infer<typeof accessTokenSchema>;

export const createAccessTokenSchema = z.strictObject({
  ...accessTokenFields,
  mails: accessTokenFields.mails.default('failed'),
});
export type CreateAccessToken = z.input<typeof createAccessTokenSchema>;

export const updateAccessTokenSchema = z
  .strictObject({ name: accessTokenFields.name, mails: accessTokenFields.mails })
  .partial();
export type UpdateAccessToken = z.infer<typeof updateAccessTokenSchema>;

/** Shown once: what is kept of the token itself is a hash. */
export const newAccessTokenSchema = accessTokenSchema
  .extend({ token: z.string().describe('For the header `Authorization: Bearer …`') })
  .meta({ id: 'NewAccessToken' });
export type NewAccessToken = z.infer<typeof newAccessTokenSchema>;

export const accessTokenPaths = {
  /** GET: 200 AccessToken[]; POST createAccessTokenSchema: 201 NewAccessToken. */
  all: '/api/v1/account/tokens',
  /** PATCH updateAccessTokenSchema: 200 AccessToken; DELETE: 204, and the token is good for nothing. */
  one: (tokenId: string) => `/api/v1/account/tokens/${tokenId}`,
} as const;

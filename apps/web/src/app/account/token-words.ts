import { type AccessToken, TOKEN_MAILS, TOKEN_SCOPES } from '@stillpier/contract';

const SCOPE_WORDS: Record<AccessToken['scope'], string> = {
  upload: 'Send logs',
  read: 'Read nights and figures',
};
const MAIL_WORDS: Record<AccessToken['mails'], string> = {
  failed: 'When a log fails',
  always: 'About every log',
};

export const scopeWord = (scope: AccessToken['scope']): string => SCOPE_WORDS[scope];
export const SCOPE_CHOICES = TOKEN_SCOPES.map((value) => ({ value, words: SCOPE_WORDS[value] }));
export const MAIL_CHOICES = TOKEN_MAILS.map((value) => ({ value, words: MAIL_WORDS[value] }));

import type * as z from 'zod';

export interface Answer {
  readonly description: string;
  /** Left out where the answer has no body. */
  readonly schema?: z.ZodType;
  /** JSON unless it says otherwise. */
  readonly contentType?: string;
}

/** What one route takes and answers; each resource describes its own beside its routes. */
export interface Operation {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete';
  /** As in the contract, with the names of parameters in braces. */
  readonly path: string;
  readonly tag: string;
  readonly summary: string;
  readonly signedIn: boolean;
  /** Whether a token for uploads is enough; what is read may be read with a token for reading. */
  readonly byUploadToken?: boolean;
  readonly params?: z.ZodObject;
  readonly query?: z.ZodObject;
  readonly headers?: z.ZodObject;
  readonly body?: { readonly schema: z.ZodType; readonly contentType?: string };
  readonly answers: Readonly<Record<number, Answer>>;
  /** Statuses of the refusals beside 500, each a problem document. */
  readonly problems: readonly number[];
}

import { HttpClient, httpResource, type HttpResourceRef } from '@angular/common/http';
import { inject, Injectable } from '@angular/core';
import {
  type AccessToken,
  accessTokenPaths,
  accessTokenSchema,
  type CreateAccessToken,
  type NewAccessToken,
  newAccessTokenSchema,
  type UpdateAccessToken,
} from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';
import * as z from 'zod';

const accessTokenListSchema = z.array(accessTokenSchema);

@Injectable({ providedIn: 'root' })
export class AccessTokensApi {
  private readonly http = inject(HttpClient);

  list(): HttpResourceRef<AccessToken[] | undefined> {
    return httpResource(() => accessTokenPaths.all, {
      parse: (body) => accessTokenListSchema.parse(body),
    });
  }

  /** The answer alone holds the token itself. */
  async create(body: CreateAccessToken): Promise<NewAccessToken> {
    const answer = await firstValueFrom(this.http.post(accessTokenPaths.all, body));
    return newAccessTokenSchema.parse(answer);
  }

  async update({ id }: AccessToken, body: UpdateAccessToken): Promise<AccessToken> {
    const answer = await firstValueFrom(this.http.patch(accessTokenPaths.one(id), body));
    return accessTokenSchema.parse(answer);
  }

  async revoke({ id }: AccessToken): Promise<void> {
    await firstValueFrom(this.http.delete(accessTokenPaths.one(id)));
  }
}

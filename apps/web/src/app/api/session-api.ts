import { HttpClient } from '@angular/common/http';
import { computed, inject, Injectable, signal } from '@angular/core';
import { type Account, accountPaths, sessionSchema, type SignIn } from '@stillpier/contract';
import { firstValueFrom } from 'rxjs';

/** Who is signed in. Asked once when the first guard needs it, then kept. */
@Injectable({ providedIn: 'root' })
export class SessionApi {
  private readonly http = inject(HttpClient);
  private readonly known = signal<Account | null | undefined>(undefined);

  /** The account that is signed in; null when nobody is, or when it is not known yet. */
  readonly account = computed(() => this.known() ?? null);

  async ready(): Promise<Account | null> {
    const known = this.known();
    if (known !== undefined) return known;
    return this.take(await firstValueFrom(this.http.get(accountPaths.session)));
  }

  async signIn(body: SignIn): Promise<void> {
    this.take(await firstValueFrom(this.http.post(accountPaths.session, body)));
  }

  async signOut(): Promise<void> {
    await firstValueFrom(this.http.delete(accountPaths.session));
    this.forget();
  }

  /** The session ended elsewhere. */
  forget(): void {
    this.known.set(null);
  }

  /** The account was changed by its own page. */
  changed(account: Account): void {
    this.known.set(account);
  }

  private take(body: unknown): Account | null {
    const { account } = sessionSchema.parse(body);
    this.known.set(account);
    return account;
  }
}

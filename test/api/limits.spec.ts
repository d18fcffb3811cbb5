import { accountPaths, problemSchema } from '@stillpier/contract';
import { afterEach, describe, expect, it } from 'vitest';
import type { Allowances } from '../../server/http/limits';
import { makeApp, PASSWORD, type TestApp } from '../support/api-app';

let app: TestApp;
afterEach(() => app.close());

const tries = (number: number) => ({ tries: number, seconds: 600 });
async function appWith(allowances: Partial<Allowances>): Promise<void> {
  app = await makeApp({ allowances });
}
const signIn = (email: string, password: string) =>
  app.agent().post(accountPaths.session).send({ email, password });

describe('tries to sign in', () => {
  it('are limited for one account, known or not, and no other', async () => {
    await appWith({ signInByEmail: tries(3) });
    await app.signedUp('known@stillpier.test');
    await app.signedUp('other@stillpier.test');
    for (const email of ['known@stillpier.test', 'Unknown@stillpier.test']) {
      for (let count = 0; count < 3; count++) await signIn(email, 'wrong').expect(401);
      const refused = await signIn(email.toLowerCase(), PASSWORD).expect(429);
      expect(problemSchema.parse(refused.body).type).toBe('too-many-requests');
      expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
      expect(Number(refused.headers['retry-after'])).toBeLessThanOrEqual(600);
    }
    await signIn('other@stillpier.test', PASSWORD).expect(200);
  });

  it('are counted anew after the right password', async () => {
    await appWith({ signInByEmail: tries(2) });
    await app.signedUp('known@stillpier.test');
    for (let round = 0; round < 3; round++) {
      await signIn('known@stillpier.test', 'wrong').expect(401);
      await signIn('known@stillpier.test', PASSWORD).expect(200);
    }
  });

  it('are limited for one network address over all accounts', async () => {
    await appWith({ signInByAddress: tries(4) });
    for (let count = 0; count < 4; count++)
      await signIn(`account${count}@stillpier.test`, 'wrong').expect(401);
    await signIn('account9@stillpier.test', 'wrong').expect(429);
  });
});

describe('e-mails to one address', () => {
  it('are limited over sign-ups and password resets together', async () => {
    await appWith({ mailByEmail: tries(2) });
    const email = 'target@stillpier.test';
    const signUp = { email, name: 'A tester', password: PASSWORD };
    await app.agent().post(accountPaths.accounts).send(signUp).expect(202);
    await app.agent().post(accountPaths.passwordResets).send({ email }).expect(202);
    await app.agent().post(accountPaths.passwordResets).send({ email }).expect(429);
    await app.agent().post(accountPaths.accounts).send(signUp).expect(429);
    const other = { email: 'other@stillpier.test' };
    await app.agent().post(accountPaths.passwordResets).send(other).expect(202);
  });

  it('are limited for the network address that asks', async () => {
    await appWith({ mailByAddress: tries(1) });
    const ask = (email: string) => app.agent().post(accountPaths.passwordResets).send({ email });
    await ask('one@stillpier.test').expect(202);
    await ask('two@stillpier.test').expect(429);
  });
});

describe('guesses at tokens', () => {
  it('are limited for the network address', async () => {
    await appWith({ tokenByAddress: tries(2) });
    const body = { token: 'x'.repeat(43) };
    await app.agent().post(accountPaths.confirmations).send(body).expect(422);
    const reset = { ...body, password: PASSWORD };
    await app.agent().put(accountPaths.passwordResets).send(reset).expect(422);
    await app.agent().post(accountPaths.confirmations).send(body).expect(429);
  });
});

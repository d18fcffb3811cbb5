import { ChangeDetectionStrategy, Component } from '@angular/core';
import { accountPaths } from '@stillpier/contract';
import { openPage } from '../../testing/page-under-test';
import { anAccount } from '../../testing/answers';
import { SignInPage } from './sign-in-page';

@Component({
  selector: 'app-stub-page',
  template: 'arrived',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class StubPage {}

const open = (address: string) =>
  openPage(
    [
      { path: 'sign-in', component: SignInPage },
      { path: '**', component: StubPage },
    ],
    address,
  );

async function signIn(shown: Awaited<ReturnType<typeof open>>) {
  shown.type('Email', 'ilse.varga@example.org');
  shown.type('Password', 'a long pass phrase');
  shown.press('Sign in');
  await shown.settle();
}

describe('the sign-in page', () => {
  it('leads back to the page that asked for an account', async () => {
    const shown = await open('/sign-in?returnTo=%2Frigs%2F1%2Fnights');
    await signIn(shown);
    const sent = shown.http.expectOne({ method: 'POST', url: accountPaths.session });
    expect(sent.request.body).toMatchObject({ email: 'ilse.varga@example.org', stay: false });
    sent.flush({ account: anAccount({}) });
    await shown.settle();
    expect(shown.router.url).toBe('/rigs/1/nights');
  });

  it('does not lead to another host', async () => {
    const shown = await open('/sign-in?returnTo=%2F%2Felsewhere.example');
    await signIn(shown);
    shown.http.expectOne(accountPaths.session).flush({ account: anAccount({}) });
    await shown.settle();
    expect(shown.router.url).toBe('/rigs');
  });

  it('says what the server says when the password does not fit', async () => {
    const shown = await open('/sign-in');
    await signIn(shown);
    shown.http
      .expectOne(accountPaths.session)
      .flush(
        { type: 'refused', title: 'Unauthorized', status: 401, detail: 'These do not fit.' },
        { status: 401, statusText: 'Unauthorized' },
      );
    await shown.settle();
    expect(shown.page.querySelector('[role=alert]')?.textContent).toContain('These do not fit.');
    expect(shown.router.url).toBe('/sign-in');
  });

  it('asks for an address before anything is sent', async () => {
    const shown = await open('/sign-in');
    shown.press('Sign in');
    await shown.settle();
    shown.http.expectNone(accountPaths.session);
    expect(shown.faultOf('Email')).toContain('name@example.org');
    expect(document.activeElement?.getAttribute('type')).toBe('email');
  });
});

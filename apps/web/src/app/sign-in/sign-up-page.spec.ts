import { accountPaths } from '@stillpier/contract';
import { showComponent } from '../../testing/page-under-test';
import { SignUpPage } from './sign-up-page';

describe('the page that makes an account', () => {
  it('says what happens next: the mail with the link', async () => {
    const shown = await showComponent(SignUpPage);
    shown.type('Name', 'Ilse Varga');
    shown.type('Email', 'ilse.varga@example.org');
    shown.type('Password', 'a long pass phrase');
    shown.press('Make the account');
    await shown.settle();
    shown.http.expectOne(accountPaths.accounts).flush({
      message: 'A mail is on its way.',
      localMailUrl: 'http://127.0.0.1:1080',
    });
    await shown.settle();
    const status = shown.page.querySelector('[role=status]');
    expect(status?.textContent).toContain('A mail is on its way.');
    expect(status?.textContent).toContain('ilse.varga@example.org');
    expect(status?.querySelector('a')?.getAttribute('href')).toBe('http://127.0.0.1:1080');
  });

  it('refuses a short password at its field', async () => {
    const shown = await showComponent(SignUpPage);
    shown.type('Name', 'Ilse Varga');
    shown.type('Email', 'ilse.varga@example.org');
    shown.type('Password', 'short');
    shown.press('Make the account');
    await shown.settle();
    shown.http.expectNone(accountPaths.accounts);
    expect(shown.faultOf('Password')).toContain('at least 10 characters');
  });
});

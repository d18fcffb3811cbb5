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
    shown.http.expectOne(accountPaths.accounts).flush({ message: 'A mail is on its way.' });
    await shown.settle();
    const status = shown.page.querySelector('[role=status]')?.textContent;
    expect(status).toContain('A mail is on its way.');
    expect(status).toContain('ilse.varga@example.org');
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

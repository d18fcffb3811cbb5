import { Clipboard } from '@angular/cdk/clipboard';
import { TestBed } from '@angular/core/testing';
import { type AccessToken, accessTokenPaths } from '@stillpier/contract';
import { showComponent } from '../../testing/page-under-test';
import { TokenList } from './token-list';

const TOKEN: AccessToken = {
  id: '00000000-0000-4000-8000-000000000021',
  name: 'dome computer',
  scope: 'upload',
  expiresAt: '2030-06-01T21:59:59Z',
  mails: 'failed',
  lastUsedAt: null,
  createdAt: '2026-05-09T10:00:00Z',
};
const SECRET = 'stillpier_0123456789';

async function showTokens(tokens: AccessToken[] = [TOKEN]) {
  const shown = await showComponent(TokenList);
  shown.http.expectOne(accessTokenPaths.all).flush(tokens);
  await shown.settle();
  return shown;
}

describe('TokenList', () => {
  it('says what a token may do, when it was used and when it ends', async () => {
    const { page } = await showTokens();
    const row = page.querySelector('tbody tr')!.textContent.replace(/\s+/g, ' ');
    expect(row).toContain('dome computer');
    expect(row).toContain('Send logs');
    expect(row).toContain('not used yet');
    expect(row).toContain('Jun 2030');
  });

  it('makes a token that ends with the day that was chosen, and shows it once with a button to copy it', async () => {
    const { http, page, press, settle, type } = await showTokens([]);
    const copy = vi.spyOn(TestBed.inject(Clipboard), 'copy').mockReturnValue(true);
    type('Name of the token', 'dome computer');
    type('Last day', '2030-06-01');
    press('Make the token');
    const made = http.expectOne({ method: 'POST', url: accessTokenPaths.all });
    expect(made.request.body).toEqual({
      name: 'dome computer',
      scope: 'upload',
      mails: 'failed',
      expiresAt: new Date('2030-06-01T23:59:59').toISOString(),
    });
    made.flush({ ...TOKEN, token: SECRET });
    await settle();
    http.expectOne(accessTokenPaths.all).flush([TOKEN]);
    await settle();
    expect(page.querySelector('app-new-token code')?.textContent).toBe(SECRET);
    press('Copy the token');
    expect(copy).toHaveBeenCalledWith(SECRET);
    press('Done, hide it');
    await settle();
    expect(page.textContent).not.toContain(SECRET);
  });

  it('asks before it revokes', async () => {
    const { http, page, settle } = await showTokens();
    page.querySelector<HTMLElement>('button[aria-label^="Revoke"]')!.click();
    await settle();
    http.expectNone({ method: 'DELETE', url: accessTokenPaths.one(TOKEN.id) });
    const dialog = document.querySelector('mat-dialog-container')!;
    [...dialog.querySelectorAll('button')].find((b) => b.textContent.includes('Revoke'))!.click();
    await vi.waitFor(() => {
      TestBed.tick();
      http.expectOne({ method: 'DELETE', url: accessTokenPaths.one(TOKEN.id) }).flush(null);
    });
    await settle();
    http.expectOne(accessTokenPaths.all).flush([]);
    await settle();
    expect(page.textContent).toContain('No token is out.');
  });

  it('changes when it writes', async () => {
    const { http, page } = await showTokens();
    const select = page.querySelector<HTMLSelectElement>('tbody select')!;
    select.value = 'always';
    select.dispatchEvent(new Event('change'));
    const change = http.expectOne({ method: 'PATCH', url: accessTokenPaths.one(TOKEN.id) });
    expect(change.request.body).toEqual({ mails: 'always' });
    change.flush({ ...TOKEN, mails: 'always' });
  });
});

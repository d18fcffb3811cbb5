import { accountPaths } from '@stillpier/contract';
import { openPage } from '../../testing/page-under-test';
import { ConfirmPage } from './confirm-page';

const open = (address: string) => openPage([{ path: 'confirm', component: ConfirmPage }], address);

describe('the page that confirms an address', () => {
  it('sends the token of the link when asked to, not before', async () => {
    const shown = await open('/confirm#token=a-token-of-some-length');
    shown.http.expectNone(accountPaths.confirmations);
    shown.press('Confirm the address');
    const sent = shown.http.expectOne(accountPaths.confirmations);
    expect(sent.request.body).toEqual({ token: 'a-token-of-some-length' });
    sent.flush({});
    await shown.settle();
    expect(shown.page.textContent).toContain('The account is ready.');
  });

  it('says that an old link is refused, and how to get a new one', async () => {
    const shown = await open('/confirm#token=a-token-of-some-length');
    shown.press('Confirm the address');
    shown.http
      .expectOne(accountPaths.confirmations)
      .flush(
        { type: 'x', title: 'Gone', status: 410, detail: 'This link is used up.' },
        { status: 410, statusText: 'Gone' },
      );
    await shown.settle();
    expect(shown.page.querySelector('[role=alert]')?.textContent).toContain('used up');
    expect(shown.page.querySelector('[role=alert] a')?.textContent).toContain('get a new one');
  });

  it.each(['/confirm', '/confirm#token=cut-short'])(
    'says when the link is cut short, as in %s',
    async (address) => {
      const shown = await open(address);
      expect(shown.page.textContent).toContain('This link is not whole');
    },
  );
});

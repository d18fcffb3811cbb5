import { ChangeDetectionStrategy, Component } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { accountPaths, rigPaths } from '@stillpier/contract';
import { anAccount, fieldRig } from '../../testing/answers';
import { showComponent } from '../../testing/page-under-test';
import { SessionApi } from '../api/session-api';
import { Router } from '@angular/router';
import { Shell } from './shell';

@Component({
  selector: 'app-stub-page',
  template: '<h1>A page</h1>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
class StubPage {}

const ROUTES = [
  { path: 'rigs/:rigId/nights', component: StubPage },
  { path: '**', component: StubPage },
];
const rig = fieldRig({});
const balcony = fieldRig({ id: '00000000-0000-4000-8000-000000000002', name: 'Balcony' });

async function showShell(address: string, rigs = [rig, balcony]) {
  const shown = await showComponent(Shell);
  shown.router.resetConfig(ROUTES);
  TestBed.inject(SessionApi).changed(anAccount({}));
  await shown.router.navigateByUrl(address);
  await shown.settle();
  shown.http.expectOne(rigPaths.all).flush(rigs);
  await shown.settle();
  return shown;
}
const textOf = (page: HTMLElement, selector: string) =>
  page.querySelector(selector)?.textContent.replace(/\s+/g, ' ').trim();

describe('the shell', () => {
  it('shows a person without a session the mark and the themes only', async () => {
    const { page } = await showComponent(Shell);
    expect(textOf(page, '.brand')).toBe('Stillpier');
    expect(page.querySelector('app-theme-switch')).not.toBeNull();
    expect(page.querySelector('.person, .rig-picker, nav')).toBeNull();
  });

  it('names the rig of the page and marks the page one is on', async () => {
    const { page } = await showShell(`/rigs/${rig.id}/nights`);
    expect(textOf(page, '.rig-picker')).toBe('Rig: North pier');
    expect(textOf(page, 'nav [aria-current=page]')).toBe('Nights');
  });

  it('lists the other rigs and the settings in the rig picker', async () => {
    const { page, settle } = await showShell(`/rigs/${rig.id}/nights`);
    page.querySelector<HTMLElement>('.rig-picker')!.click();
    await settle();
    const items = [...document.querySelectorAll('[role=menuitem]')].map((item) =>
      item.textContent.trim(),
    );
    expect(items).toEqual(['North pier', 'Balcony', 'Rig settings', 'All rigs', 'New rig']);
  });

  it('offers no logs to be added to a rig that one only advises', async () => {
    const advised = fieldRig({ role: 'advisor' });
    const { page } = await showShell(`/rigs/${rig.id}/nights`, [advised]);
    expect(page.textContent).not.toContain('Add logs');
  });

  it('has the theme that was pressed', async () => {
    const { page, press, settle } = await showShell('/rigs');
    press('Red light');
    await settle();
    expect(document.documentElement.className).toBe('theme-red');
    expect(textOf(page, '.choice [aria-pressed=true]')).toBe('Red light');
    press('Day');
  });

  it('gives the focus to the page after a change of page, and to nothing else', async () => {
    const { page, router, settle } = await showShell('/rigs');
    await router.navigateByUrl('/rigs?sort=name');
    await settle();
    expect(document.activeElement).not.toBe(page.querySelector('main'));
    await router.navigateByUrl('/account');
    await settle();
    expect(document.activeElement).toBe(page.querySelector('main'));
  });

  it('leads to the sign-in page when the session has ended elsewhere', async () => {
    const { http, settle } = await showShell('/rigs');
    TestBed.inject(SessionApi)
      .signOut()
      .catch(() => null);
    http
      .expectOne(accountPaths.session)
      .flush(
        { type: 'signed-out', title: 'Unauthorized', status: 401, detail: 'Sign in first.' },
        { status: 401, statusText: 'Unauthorized' },
      );
    await settle();
    expect(TestBed.inject(Router).url).toBe('/sign-in?returnTo=%2Frigs');
  });
});

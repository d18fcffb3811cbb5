import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { nightPaths, type NightSummary } from '@stillpier/contract';
import { NightsPage } from './nights-page';

const RIG = '11111111-1111-4111-8111-111111111111';
const LIST = `${nightPaths.all(RIG)}?limit=1000`;

const nightOf = (date: string, more: Partial<NightSummary> = {}): NightSummary => ({
  date,
  startsAt: `${date}T18:00:00Z`,
  endsAt: `${date}T23:00:00Z`,
  targets: ['M 33'],
  runCount: 1,
  guidedHours: 4.5,
  frames: 8000,
  used: 7600,
  raRmsArcsec: 0.654,
  decRmsArcsec: 0.431,
  totalRmsArcsec: 0.783,
  aspect: 1.12,
  positionAngleDegrees: 80,
  keptShare: 0.76,
  mainLimit: { code: 'periodic-error', severity: 'act' },
  ...more,
});

async function renderNights(nights: NightSummary[]) {
  TestBed.configureTestingModule({
    providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
  });
  const fixture = TestBed.createComponent(NightsPage);
  fixture.componentRef.setInput('rigId', RIG);
  TestBed.tick();
  const http = TestBed.inject(HttpTestingController);
  http.expectOne(LIST).flush({ items: nights, next: null });
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const cells = () =>
    [...page.querySelectorAll('tbody tr')].map((row) =>
      [...row.querySelectorAll('td')].map((cell) => cell.textContent.replace(/\s+/g, ' ').trim()),
    );
  return { fixture, page, cells };
}

describe('NightsPage', () => {
  it('shows each night with its measures, its star and what limited it', async () => {
    const { page, cells } = await renderNights([nightOf('2026-11-28')]);
    expect(cells()).toEqual([
      [
        '28 Nov 2026',
        'M 33',
        '4.5 h',
        '0.65″',
        '0.43″',
        '0.78″',
        '',
        '1.12',
        '76 %',
        'Act: periodic error',
      ],
    ]);
    expect(page.querySelector('h1')?.textContent.replace(/\s+/g, ' ').trim()).toBe(
      '1 night with 4.5 h of guiding. The last one ran at 0.78″ total RMS.',
    );
    expect(page.querySelector('td a')?.getAttribute('href')).toBe(`/rigs/${RIG}/nights/2026-11-28`);
  });

  it('sorts by a measure, nights without it at the end either way', async () => {
    const { fixture, page, cells } = await renderNights([
      nightOf('2026-11-28', { raRmsArcsec: 0.9 }),
      nightOf('2026-11-27', { raRmsArcsec: null }),
      nightOf('2026-11-26', { raRmsArcsec: 0.5 }),
    ]);
    const head = [...page.querySelectorAll('th')].find((th) => th.textContent.trim() === 'RA')!;
    head.querySelector<HTMLElement>('.mat-sort-header-container')!.click();
    await fixture.whenStable();
    expect(cells().map((row) => row[3])).toEqual(['0.50″', '0.90″', '–']);
    head.querySelector<HTMLElement>('.mat-sort-header-container')!.click();
    await fixture.whenStable();
    expect(cells().map((row) => row[3])).toEqual(['0.90″', '0.50″', '–']);
  });

  it('filters by words and by what limited the night', async () => {
    const { fixture, page, cells } = await renderNights([
      nightOf('2026-11-28'),
      nightOf('2026-11-27', { targets: ['IC 405'], mainLimit: null }),
    ]);
    const field = page.querySelector('input')!;
    field.value = 'ic 4';
    field.dispatchEvent(new Event('input'));
    await fixture.whenStable();
    expect(cells().map((row) => row[1])).toEqual(['IC 405']);

    const limit = page.querySelector('select')!;
    limit.value = 'periodic-error';
    limit.dispatchEvent(new Event('change'));
    await fixture.whenStable();
    expect(page.textContent).toContain('No night fits.');
  });

  it('says what to do when there is no night yet', async () => {
    const { page } = await renderNights([]);
    expect(page.querySelector('h1')?.textContent).toContain('No nights yet');
    expect(page.querySelector('.actions a')?.getAttribute('href')).toBe(`/rigs/${RIG}/import`);
    expect(page.querySelector('table')).toBeNull();
  });

  it('offers another try when the nights do not come', async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    const fixture = TestBed.createComponent(NightsPage);
    fixture.componentRef.setInput('rigId', RIG);
    TestBed.tick();
    TestBed.inject(HttpTestingController)
      .expectOne(LIST)
      .flush(null, { status: 500, statusText: 'failed' });
    await fixture.whenStable();
    const page = fixture.nativeElement as HTMLElement;
    expect(page.querySelector('[role=alert]')?.textContent).toContain(
      'The nights could not be loaded.',
    );
  });
});

import { HttpEventType, provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import {
  columnMapPaths,
  importPaths,
  type LogImport,
  ownColumnMapPaths,
  type Rig,
  rigPaths,
  setupPaths,
} from '@stillpier/contract';
import { FakeEventSource } from '../../testing/fake-event-source';
import { ImportPage } from './import-page';

const RIG = '11111111-1111-4111-8111-111111111111';
const rig: Rig = {
  id: RIG,
  name: 'North pier',
  role: 'owner',
  version: 1,
  createdAt: '2026-09-01T12:00:00Z',
  mount: {
    kind: 'worm',
    wormTeeth: 180,
    wormPeriodSeconds: null,
    gearStages: [],
    guideRateSidereal: 0.5,
  },
  site: { latitudeDegrees: 50, longitudeDegrees: 8, timeZone: 'Europe/Berlin' },
};
const imported = (more: Partial<LogImport>): LogImport => ({
  id: '44444444-4444-4444-8444-444444444444',
  rigId: RIG,
  setupId: null,
  fileName: 'known.csv',
  sizeBytes: 100,
  sha256: 'a'.repeat(64),
  state: 'waiting',
  progress: 0,
  stage: 'Waiting for its turn',
  error: null,
  attempt: 1,
  lines: null,
  frames: null,
  refusedCount: null,
  nights: [],
  duplicate: false,
  createdAt: '2026-11-29T08:11:00Z',
  ...more,
});

const DOCUMENT = {
  reading: {
    lines: 7204,
    frames: 7200,
    refusedCount: 3,
    refused: [{ line: 2118, reason: 'The time runs backwards.' }],
    delimiter: ',',
    decimal: '.',
    encoding: 'utf-8',
    headerLine: 1,
    columns: {},
    warnings: ['The frames come every 2 s, then every 4 s from line 900.'],
  },
};

const KNOWN = new File(
  [
    'timestamp,ra error arcsec,dec error arcsec\n' +
      '2026-11-28T18:42:15Z,0.45,-0.67\n2026-11-28T18:42:17Z,-0.01,0.09\n',
  ],
  'known.csv',
);
const OTHER = new File(
  ['clock,dRA,dDec\n18:42:15,0.45,-0.67\n18:42:17,-0.01,0.09\n'],
  'guide_2026-11-28.csv',
);

async function renderImport() {
  vi.stubGlobal('EventSource', FakeEventSource);
  TestBed.configureTestingModule({
    providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
  });
  const fixture = TestBed.createComponent(ImportPage);
  fixture.componentRef.setInput('rigId', RIG);
  TestBed.tick();
  const http = TestBed.inject(HttpTestingController);
  http.expectOne(rigPaths.one(RIG)).flush(rig);
  http.expectOne(setupPaths.all(RIG)).flush([]);
  http.expectOne(columnMapPaths.all(RIG)).flush([]);
  http.expectOne(ownColumnMapPaths.all).flush([]);
  http.expectOne(importPaths.all(RIG)).flush({ items: [], next: null });
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const text = (selector: string) =>
    page.querySelector(selector)?.textContent.replace(/\s+/g, ' ').trim();
  const pick = async (...files: File[]) => {
    const input = page.querySelector<HTMLInputElement>('input[type=file]')!;
    Object.defineProperty(input, 'files', { value: files, configurable: true });
    Object.defineProperty(input, 'value', { value: '', writable: true, configurable: true });
    input.dispatchEvent(new Event('change'));
    await vi.waitFor(() => {
      TestBed.tick();
      expect(text('app-file-list')).not.toContain('Reading');
    });
  };
  const select = async (label: string, value: string) => {
    const field = page.querySelector<HTMLSelectElement>(`select[aria-label="${label}"]`)!;
    field.value = value;
    field.dispatchEvent(new Event('change'));
    await fixture.whenStable();
  };
  const press = (name: RegExp) => {
    [...page.querySelectorAll('button')]
      .find((each) => name.test(each.textContent.trim()))!
      .click();
    TestBed.tick();
  };
  return { fixture, http, page, text, pick, select, press };
}

describe('ImportPage', () => {
  afterEach(() => vi.unstubAllGlobals());

  it('asks nothing about a log with known headers, and follows it to its night', async () => {
    const { fixture, http, text, pick, press } = await renderImport();
    await pick(KNOWN);
    expect(text('app-file-list')).toContain('Ready');

    press(/^Add 1 file to North pier$/);
    const upload = http.expectOne({ method: 'POST', url: importPaths.all(RIG) });
    expect(JSON.parse((upload.request.body as FormData).get('options') as string)).toEqual({
      setupId: null,
      map: null,
    });
    upload.event({ type: HttpEventType.UploadProgress, loaded: 40, total: 100 });
    await fixture.whenStable();
    expect(text('app-file-list')).toContain('Sending40 %');
    expect(fixture.componentInstance.isSending()).toBe(true);

    upload.flush(imported({}));
    FakeEventSource.last.tell(
      imported({ state: 'running', progress: 0.64, stage: 'Analysing the runs' }),
    );
    await fixture.whenStable();
    expect(text('app-file-list')).toContain('Analysing the runs64 %');
    expect(fixture.componentInstance.isSending()).toBe(false);

    FakeEventSource.last.tell(
      imported({
        state: 'done',
        progress: 1,
        frames: 7200,
        refusedCount: 3,
        nights: ['2026-11-28'],
      }),
    );
    TestBed.tick();
    http.expectOne(importPaths.document(RIG, imported({}).id)).flush(DOCUMENT);
    await fixture.whenStable();
    expect(text('app-reading-notes')).toContain('every 2 s, then every 4 s');
    expect(text('app-reading-notes')).toContain('line 2 118The time runs backwards.');
    expect(text('app-file-list')).toContain(
      'Read, 3 lines refused7 200 framesNight of 28 Nov 2026',
    );
    expect(text('h1')).toBe('7 200 frames read from 1 file. 3 lines could not be used.');
  });

  it('asks for columns, units and the date that it cannot know, then sends them as a map', async () => {
    const { http, text, pick, select, press } = await renderImport();
    await pick(OTHER);
    expect(text('app-file-list')).toContain('Columns to name');
    expect(text('.missing')).toContain('the time, the RA error and the Dec error');

    await select('What clock is', 'time');
    await select('What dRA is', 'raError');
    await select('What dDec is', 'decError');
    await select('Unit of clock', 'clock');
    await select('Unit of dRA', 'arcsec');
    await select('Unit of dDec', 'arcsec');
    expect(text('app-start-field')).toContain('taken from the name of the file');

    press(/^Add 1 file/);
    const upload = http.expectOne({ method: 'POST', url: importPaths.all(RIG) });
    expect(JSON.parse((upload.request.body as FormData).get('options') as string)).toEqual({
      setupId: null,
      map: {
        columns: {
          clock: { role: 'time', unit: 'clock' },
          dRA: { role: 'raError', unit: 'arcsec' },
          dDec: { role: 'decError', unit: 'arcsec' },
        },
        startTime: '2026-11-28T17:42:15.000Z', // 18:42:15 in Berlin, UTC+1
      },
    });
    upload.flush(imported({ fileName: OTHER.name }));
  });

  it('says why a file was not taken and sends it again', async () => {
    const { fixture, http, text, pick, press } = await renderImport();
    await pick(KNOWN);
    press(/^Add 1 file/);
    http
      .expectOne({ method: 'POST', url: importPaths.all(RIG) })
      .flush(null, { status: 503, statusText: 'busy' });
    await fixture.whenStable();
    expect(text('app-file-list')).toContain('Not sent');
    press(/^Try again$/);
    http.expectOne({ method: 'POST', url: importPaths.all(RIG) }).flush(imported({}));
    await fixture.whenStable();
    expect(text('app-file-list')).not.toContain('Not sent');
  });

  it('sends one file after another, and stops one without the others', async () => {
    const { http, page, text, pick, press } = await renderImport();
    await pick(KNOWN, new File([KNOWN], 'second.csv'));
    press(/^Add 2 files/);
    const first = http.expectOne({ method: 'POST', url: importPaths.all(RIG) });
    expect(text('app-file-list')).toContain('Waiting to be sent');
    page.querySelector<HTMLElement>('[aria-label="Stop sending known.csv"]')!.click();
    expect(first.cancelled).toBe(true);
    await vi.waitFor(() => {
      TestBed.tick();
      http
        .expectOne({ method: 'POST', url: importPaths.all(RIG) })
        .flush(imported({ fileName: 'second.csv' }));
    });
    TestBed.tick();
    expect(text('app-file-list')).toContain('Stopped before it had arrived');
    press(/^Try again$/);
    const again = http.expectOne({ method: 'POST', url: importPaths.all(RIG) });
    expect(((again.request.body as FormData).get('file') as File).name).toBe('known.csv');
  });

  it('shows the progress of what was sent before the page was opened', async () => {
    const { fixture, page } = await renderImport();
    FakeEventSource.last.tell(imported({ state: 'running', progress: 0.4, stage: 'Reading' }));
    await fixture.whenStable();
    const bar = page.querySelector('app-earlier-imports [role=progressbar]');
    expect(bar?.getAttribute('aria-valuenow')).toBe('40');
  });

  it('reads a file by another delimiter when a person says so', async () => {
    const { fixture, page, text, pick } = await renderImport();
    await pick(new File(['clock;dRA;dDec\n18:42:15;0,45;-0,67\n'], 'other.csv'));
    expect(text('app-column-picker .header')).toBe('clockdRAdDec');
    const delimiter = page.querySelector<HTMLSelectElement>('app-map-settings select')!;
    delimiter.value = ',';
    delimiter.dispatchEvent(new Event('change'));
    await fixture.whenStable();
    expect(text('app-column-picker .header')).not.toBe('clockdRAdDec');
  });

  it('says that a file was known already', async () => {
    const { fixture, http, text, pick, press } = await renderImport();
    FakeEventSource.last.tell(imported({ state: 'done', frames: 7200, nights: ['2026-11-28'] }));
    await pick(KNOWN);
    press(/^Add 1 file/);
    http
      .expectOne({ method: 'POST', url: importPaths.all(RIG) })
      .flush(imported({ state: 'done', frames: 7200, nights: ['2026-11-28'], duplicate: true }));
    TestBed.tick();
    http.expectOne(importPaths.document(RIG, imported({}).id)).flush(DOCUMENT);
    await fixture.whenStable();
    expect(text('app-file-list')).toContain('Known already');
    expect(text('app-file-list')).toContain('since 29 Nov 2026');
  });

  it('says why a file cannot be read at all', async () => {
    const { text, pick } = await renderImport();
    await pick(new File([], 'empty.csv'));
    expect(text('app-file-list')).toContain('The file is empty.');
  });

  it('stops listening when it is left', async () => {
    const { fixture } = await renderImport();
    fixture.destroy();
    expect(FakeEventSource.last.close).toHaveBeenCalledOnce();
  });
});

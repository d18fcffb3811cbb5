import { TestBed } from '@angular/core/testing';
import {
  columnMapPaths,
  importPaths,
  type LogImport,
  ownColumnMapPaths,
  rigPaths,
  setupPaths,
} from '@stillpier/contract';
import { fieldRig, fieldSetup } from '../../testing/answers';
import { FakeEventSource } from '../../testing/fake-event-source';
import { openPage } from '../../testing/page-under-test';
import { SessionApi } from '../api/session-api';
import { LogPage } from './log-page';

const rig = fieldRig({});
const IMPORT = '44444444-4444-4444-8444-444444444444';
const SETUP = '00000000-0000-4000-8000-000000000005';
const OTHER_SETUP = '00000000-0000-4000-8000-000000000006';
const log = (more: Partial<LogImport>): LogImport => ({
  id: IMPORT,
  rigId: rig.id,
  setupId: SETUP,
  fileName: 'pier.csv',
  sizeBytes: 900_000,
  sha256: 'a'.repeat(64),
  state: 'done',
  progress: 1,
  stage: 'Done',
  error: null,
  attempt: 1,
  lines: 14_965,
  frames: 14_961,
  refusedCount: 300,
  nights: ['2026-11-28'],
  duplicate: false,
  createdAt: '2026-11-29T08:11:00Z',
  ...more,
});
const DOCUMENT = {
  reading: {
    lines: 14_965,
    frames: 14_961,
    refusedCount: 300,
    refused: [
      { line: 2118, reason: 'The time runs backwards.' },
      { line: 6902, reason: '=HYPERLINK("x") is not a number.' },
    ],
    delimiter: ',',
    decimal: '.',
    encoding: 'utf-8',
    headerLine: 1,
    columns: {},
    warnings: ['The star moves by 40″ rms: is the unit right?'],
  },
};
const LOG = 'timestamp,ra error arcsec,dec error arcsec\n2026-11-28T18:42:15Z,0.45,-0.67\n';

async function openLog(first = log({})) {
  vi.stubGlobal('EventSource', FakeEventSource);
  const routes = [{ path: 'rigs/:rigId/import/:importId', component: LogPage }];
  const shown = await openPage(routes, `/rigs/${rig.id}/import/${IMPORT}`);
  const { http, settle } = shown;
  TestBed.inject(SessionApi).changed({
    id: IMPORT,
    email: 'ilse@example.org',
    name: 'Ilse',
    kind: 'member',
    createdAt: rig.createdAt,
  });
  await settle();
  http.expectOne(rigPaths.all).flush([rig]);
  http.expectOne(rigPaths.one(rig.id)).flush(rig);
  http.expectOne(importPaths.one(rig.id, IMPORT)).flush(first);
  await settle();
  for (const request of http.match(importPaths.document(rig.id, IMPORT))) request.flush(DOCUMENT);
  http
    .expectOne(setupPaths.all(rig.id))
    .flush([fieldSetup({}), fieldSetup({ id: OTHER_SETUP, name: 'Long' })]);
  http.expectOne(columnMapPaths.all(rig.id)).flush([]);
  http.expectOne(ownColumnMapPaths.all).flush([]);
  await settle();
  const text = (selector: string) =>
    shown.page.querySelector(selector)?.textContent.replace(/\s+/g, ' ').trim();
  const retries = () =>
    http.expectOne({ method: 'POST', url: importPaths.retries(rig.id, IMPORT) });
  return { ...shown, text, retries };
}

describe('LogPage', () => {
  afterEach(() => vi.unstubAllGlobals());

  it('says what was read, what to look at, and which lines were left out for which reason', async () => {
    const { page, text } = await openLog();
    expect(text('h1')).toContain('14 961 frames read from 14 965 lines of pier.csv.');
    expect(text('aside')).toContain('40″ rms');
    expect(text('tbody tr')).toBe('2 118The time runs backwards.');
    expect(page.textContent).toContain('298 lines more were left out');
  });

  it('saves the lines left out as CSV, in which a spreadsheet finds no formula', async () => {
    const { press } = await openLog();
    const made = vi.fn((_file: Blob) => 'blob:log');
    vi.stubGlobal('URL', Object.assign(URL, { createObjectURL: made, revokeObjectURL: vi.fn() }));
    const click = vi.spyOn(HTMLAnchorElement.prototype, 'click').mockReturnValue();
    press('Save as CSV');
    expect(click).toHaveBeenCalledOnce();
    expect(await made.mock.calls[0]![0].text()).toBe(
      'line,reason\r\n2118,The time runs backwards.\r\n' +
        `6902,"'=HYPERLINK(""x"") is not a number."\r\n`,
    );
    click.mockRestore();
  });

  it('reads it again with another setup; the lines that stand stay until the new ones do', async () => {
    const { http, page, press, retries, settle, text } = await openLog();
    const select = page.querySelector<HTMLSelectElement>('app-read-again select')!;
    select.value = OTHER_SETUP;
    select.dispatchEvent(new Event('change'));
    press('Read with the map it had');
    const again = retries();
    expect(again.request.body).toEqual({ setupId: OTHER_SETUP });
    again.flush(log({ state: 'waiting', progress: 0, stage: 'Waiting for its turn' }));
    await settle();
    expect(text('h1')).toContain('is being read');
    expect(text('tbody tr')).toContain('2 118');

    FakeEventSource.last.tell(log({ state: 'running', progress: 0.5, stage: 'Reading' }));
    await settle();
    expect(page.querySelector('[role=progressbar]')?.getAttribute('aria-valuenow')).toBe('50');
    FakeEventSource.last.tell(log({ refusedCount: 0, frames: 14_965 }));
    await settle();
    http
      .expectOne(importPaths.document(rig.id, IMPORT))
      .flush({ reading: { ...DOCUMENT.reading, refused: [], refusedCount: 0 } });
    await settle();
    expect(text('h1')).toContain('No line was refused.');
    expect(page.querySelector('tbody')).toBeNull();
  });

  it('opens the first lines of the original to choose columns anew', async () => {
    vi.stubGlobal('fetch', vi.fn().mockResolvedValue(new Response(LOG)));
    const { page, press, retries, settle } = await openLog();
    press('Choose columns anew');
    await vi.waitFor(async () => {
      await settle();
      expect(page.querySelector('app-column-picker')).not.toBeNull();
    });
    const decimal = page.querySelectorAll<HTMLSelectElement>('app-map-settings select')[1]!;
    decimal.value = '.';
    decimal.dispatchEvent(new Event('change'));
    await settle();
    press('Read it again like this');
    expect(retries().request.body).toEqual({ setupId: SETUP, map: { decimal: '.' } });
  });

  it('says why it cannot be read again now', async () => {
    const { press, retries, settle, text } = await openLog();
    press('Read with the map it had');
    retries().flush(
      { type: 'being-read', title: 'x', status: 409, detail: 'This file is being read already.' },
      { status: 409, statusText: 'conflict' },
    );
    await settle();
    expect(text('app-read-again [role=alert]')).toBe('This file is being read already.');
  });
});

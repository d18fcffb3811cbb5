import { type ByHand, byHandPaths, type LogImport, type NightRun } from '@stillpier/contract';
import { TestBed } from '@angular/core/testing';
import { FakeEventSource } from '../../testing/fake-event-source';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { problemInterceptor } from '../api/problem-interceptor';
import { provideRouter } from '@angular/router';
import { ByHandPlate } from './by-hand-plate';
import { NightLogs } from './night-logs';
import type { ShownRun } from './shown-run';

const RIG = '11111111-1111-4111-8111-111111111111';
const RUN = '22222222-2222-4222-8222-222222222222';
const IMPORT = '33333333-3333-4333-8333-333333333333';
const shown: ShownRun = {
  id: RUN,
  number: 1,
  name: 'M 33',
  startMs: Date.parse('2026-11-28T20:00:00Z'), // 21:00:00 in Berlin
  of: { importId: IMPORT, run: { target: 'M 33' } } as NightRun,
};
const NONE: ByHand = { importId: IMPORT, stretches: [], history: [] };
const ASIDE: ByHand = {
  importId: IMPORT,
  stretches: [{ fromSeconds: 600, toSeconds: 660 }],
  history: [
    {
      id: '44444444-4444-4444-8444-444444444444',
      action: 'set aside',
      fromSeconds: 600,
      toSeconds: 660,
      reason: 'cloud',
      by: 'Ilse Varga',
      at: '2026-11-29T08:05:00Z',
    },
  ],
};

async function showPlate(answer: ByHand, mayChange = true) {
  vi.stubGlobal('EventSource', FakeEventSource);
  TestBed.configureTestingModule({
    providers: [
      NightLogs,
      provideRouter([]),
      provideHttpClient(withInterceptors([problemInterceptor])),
      provideHttpClientTesting(),
    ],
  });
  const fixture = TestBed.createComponent(ByHandPlate);
  const inputs = { rigId: RIG, run: shown, timeZone: 'Europe/Berlin', mayChange, selection: null };
  for (const [name, value] of Object.entries(inputs)) fixture.componentRef.setInput(name, value);
  TestBed.tick();
  const http = TestBed.inject(HttpTestingController);
  http.expectOne(byHandPaths.of(RIG, RUN)).flush(answer);
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const text = (selector: string) =>
    page.querySelector(selector)?.textContent.replace(/\s+/g, ' ').trim();
  const fill = (selector: string, value: string, event: string) => {
    const input = page.querySelector<HTMLInputElement>(selector)!;
    input.value = value;
    input.dispatchEvent(new Event(event));
    TestBed.tick();
  };
  const press = (name: string) => {
    [...page.querySelectorAll('button')].find((each) => each.textContent.includes(name))!.click();
    TestBed.tick();
  };
  return { fixture, http, page, text, fill, press };
}

describe('ByHandPlate', () => {
  afterEach(() => vi.unstubAllGlobals());

  it('sets the selected stretch aside, with the reason', async () => {
    const { fixture, http, text, fill, press } = await showPlate(NONE);
    expect(text('.none')).toBe('Nothing of this run is set aside by hand.');
    fixture.componentRef.setInput('selection', { fromSeconds: 600, toSeconds: 660 });
    TestBed.tick();
    fill('input[type=text]', ' cloud ', 'input');
    press('Set aside');
    const change = http.expectOne({ method: 'POST', url: byHandPaths.of(RIG, RUN) });
    expect(change.request.body).toEqual({
      action: 'set aside',
      fromSeconds: 600,
      toSeconds: 660,
      reason: 'cloud',
    });
    change.flush(ASIDE, { status: 202, statusText: 'accepted' });
    await vi.waitFor(() => {
      TestBed.tick();
      expect(text('li')).toContain('21:10:00 to 21:11:00');
    });
    expect(text('tbody tr')).toBe(
      '29 Nov 2026, 09:05Ilse Varga set aside21:10:00 to 21:11:00cloud',
    );
  });

  it('takes back between two times that are typed', async () => {
    const { http, page, fill, press } = await showPlate(ASIDE);
    const takeBack = [...page.querySelectorAll('button')].find((b) =>
      b.textContent.includes('Take back'),
    )!;
    expect(takeBack.disabled).toBe(true);
    fill('label:nth-of-type(1) input', '21:10:30', 'change');
    fill('label:nth-of-type(2) input', '21:12:00', 'change');
    fill('input[type=text]', 'it was clear again', 'input');
    press('Take back');
    expect(
      http.expectOne({ method: 'POST', url: byHandPaths.of(RIG, RUN) }).request.body,
    ).toMatchObject({ action: 'take back', fromSeconds: 630, toSeconds: 720 });
  });

  it('asks for the stretch, then for the reason, before it sends anything', async () => {
    const { fixture, http, text, press } = await showPlate(NONE);
    press('Set aside');
    expect(text('[role=alert]')).toContain('Select a stretch first');
    fixture.componentRef.setInput('selection', { fromSeconds: 600, toSeconds: 660 });
    TestBed.tick();
    press('Set aside');
    expect(text('[role=alert]')).toContain('Say why');
    http.verify();
  });

  it('says what the server refused', async () => {
    const { fixture, http, text, fill, press } = await showPlate(NONE);
    fixture.componentRef.setInput('selection', { fromSeconds: 600, toSeconds: 660 });
    fill('input[type=text]', 'cloud', 'input');
    press('Set aside');
    http
      .expectOne({ method: 'POST', url: byHandPaths.of(RIG, RUN) })
      .flush(
        { type: 'not-read', title: 'Conflict', status: 409, detail: 'The last reading failed.' },
        { status: 409, statusText: 'conflict' },
      );
    await vi.waitFor(() => {
      TestBed.tick();
      expect(text('[role=alert]')).toBe('The last reading failed.');
    });
  });

  it('shows an advisor what was set aside and nothing to change it', async () => {
    const { page, text } = await showPlate(ASIDE, false);
    expect(text('li')).toContain('21:10:00 to 21:11:00');
    expect(page.querySelector('button, input')).toBeNull();
  });

  it('looks again when somebody else has the log read', async () => {
    const { fixture, http, text } = await showPlate(NONE);
    TestBed.inject(NightLogs).rigId.set(RIG);
    TestBed.tick();
    FakeEventSource.last.tell(waiting);
    TestBed.tick();
    http.expectOne(byHandPaths.of(RIG, RUN)).flush(ASIDE);
    await fixture.whenStable();
    expect(text('li')).toContain('21:10:00 to 21:11:00');
  });
});

const waiting: LogImport = {
  id: IMPORT,
  rigId: RIG,
  setupId: null,
  fileName: 'pier.csv',
  sizeBytes: 100,
  sha256: 'a'.repeat(64),
  state: 'waiting',
  progress: 0,
  stage: 'Waiting for its turn',
  error: null,
  attempt: 0,
  lines: 100,
  frames: 99,
  refusedCount: 0,
  nights: ['2026-11-28'],
  duplicate: false,
  createdAt: '2026-11-29T08:00:00Z',
};

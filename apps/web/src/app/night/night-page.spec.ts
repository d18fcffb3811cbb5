import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { DeferBlockBehavior, TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import {
  byHandPaths,
  type Finding,
  type Night,
  type NightRun,
  nightPaths,
  type Run,
  setupPaths,
} from '@stillpier/contract';
import { FakeEventSource } from '../../testing/fake-event-source';
import { NightPage } from './night-page';

const RIG = '11111111-1111-4111-8111-111111111111';
const DATE = '2026-11-28';
const IMPORT = '33333333-3333-4333-8333-333333333333';
const idOf = (n: number) => `22222222-2222-4222-8222-00000000000${n}`;

const axis = (rmsArcsec: number) => ({
  meanArcsec: 0,
  rmsArcsec,
  rmsAboutLockArcsec: rmsArcsec,
  peakToPeakArcsec: 4,
  p95Arcsec: 1.3,
  driftArcsecPerMinute: 0,
  driftStandardError: 0,
  lag1: null,
});

const WORM: Finding = {
  code: 'periodic-error',
  severity: 'act',
  sentence: 'The worm puts 0.46″ into RA.',
  evidence: ['It is 49 % of RA.'],
  nextStep: 'Clean and regrease the RA worm.',
  gain: { rmsIfCuredArcsec: 0.461, aspectIfCured: null, subsKeptIfCured: 31 },
  caution: 'Unpower the mount and hold the tube.',
};

function runOf(n: number, target: string, raArcsec: number, more: Partial<Run> = {}): NightRun {
  return {
    id: idOf(n),
    importId: IMPORT,
    setupId: null,
    setupName: null,
    seeingFwhmArcsec: 2.1,
    optics: {
      imagingScaleArcsecPerPx: 0.97,
      guideScaleArcsecPerPx: 3.87,
      scaleRatio: 4,
      focalLengthRatio: 0.25,
      dawesArcsec: 1.1,
      rayleighArcsec: 1.3,
      seeingSamplingPx: 2.2,
      whyMissing: {},
    },
    run: {
      index: n,
      target,
      start: `2026-11-28T${17 + n}:00:00Z`,
      durationSeconds: 3000,
      cadenceSeconds: 2,
      frames: 1500,
      used: 1400 + n,
      setAside: [{ fromSeconds: 300, toSeconds: 320, frames: 100 - n, reason: 'dither' }],
      ra: axis(raArcsec),
      dec: axis(0.43),
      total: { rmsArcsec: 0.79, rmsImagingPx: 0.8, p95Arcsec: 1.6, peakArcsec: 3 },
      correlation: 0.1,
      footprint: {
        fwhmMajorArcsec: 2.61,
        fwhmMinorArcsec: 2.32,
        aspect: 1.125,
        eccentricity: 0.4,
        positionAngleDegrees: 80,
      },
      spectrum: null,
      uncorrected: null,
      periodicError: null,
      polarAlignment: null,
      backlash: null,
      response: null,
      loop: { ra: null, dec: null },
      seeingFloor: null,
      budget: null,
      subs: {
        lengthSeconds: 300,
        keepAspect: 1.15,
        count: 8,
        within: 6,
        aspects: [1.1],
        startsSeconds: [0],
      },
      findings: [],
      whyMissing: {
        budget: 'The log has no corrections, so the parts cannot be told apart.',
        periodicError: 'Needs 2 turns of the worm, 1.2 were seen.',
        spectrum: 'The run is too short for a spectrum.',
      },
      ...more,
    },
  };
}

const NIGHT: Night = {
  rigId: RIG,
  rigName: 'North pier',
  timeZone: 'Europe/Berlin',
  summary: {
    date: DATE,
    startsAt: '2026-11-28T18:00:00Z',
    endsAt: '2026-11-28T20:00:00Z',
    targets: ['M 33', 'M 81'],
    runCount: 2,
    guidedHours: 1.7,
    frames: 3000,
    used: 2803,
    raRmsArcsec: 0.65,
    decRmsArcsec: 0.43,
    totalRmsArcsec: 0.79,
    aspect: 1.125,
    positionAngleDegrees: 80,
    keptShare: 0.75,
    mainLimit: null,
  },
  sentence: [
    { text: 'The worm put ', strong: false },
    { text: '0.46″', strong: true },
    { text: ' into RA.', strong: false },
  ],
  previous: '2026-11-22',
  next: null,
  runs: [runOf(1, 'M 33', 0.654), runOf(2, 'M 81', 0.611, { findings: [WORM] })],
  logs: [
    {
      importId: IMPORT,
      fileName: 'pier_2811.csv',
      analysisVersion: '1',
      reading: {
        lines: 3002,
        frames: 3000,
        refusedCount: 1,
        refused: [{ line: 812, reason: 'RA error is not a number: "--"' }],
        delimiter: ',',
        decimal: '.',
        encoding: 'utf-8',
        headerLine: 1,
        columns: {},
        warnings: [],
      },
    },
  ],
};

const NOTHING_BY_HAND = { importId: IMPORT, stretches: [], history: [] };

/** Two frames, none set aside, in the contract's binary form. */
function series(): ArrayBuffer {
  const floats = Float32Array.of(0, 2, 0.1, -0.1, 0.2, -0.2, 0, 0);
  const answer = new ArrayBuffer(8 + floats.byteLength);
  new DataView(answer).setUint32(0, 2, true);
  new Uint8Array(answer, 8).set(new Uint8Array(floats.buffer));
  return answer;
}

async function renderNight(night: Night = NIGHT) {
  TestBed.configureTestingModule({
    providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    deferBlockBehavior: DeferBlockBehavior.Manual, // the charts have specs of their own
  });
  const fixture = TestBed.createComponent(NightPage);
  fixture.componentRef.setInput('rigId', RIG);
  fixture.componentRef.setInput('date', DATE);
  TestBed.tick();
  const http = TestBed.inject(HttpTestingController);
  http.expectOne(nightPaths.one(RIG, DATE)).flush(night);
  http.expectOne(setupPaths.all(RIG)).flush([]);
  await vi.waitFor(() => {
    TestBed.tick();
    const asked = http.match((request) => request.url.endsWith('/series'));
    expect(asked).toHaveLength(2);
    for (const request of asked) request.flush(series());
  });
  http.expectOne(byHandPaths.of(RIG, idOf(2))).flush(NOTHING_BY_HAND);
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const plate = (name: string) =>
    page.querySelector(`app-${name}-plate`)!.textContent.replace(/\s+/g, ' ');
  return { fixture, http, page, plate };
}

describe('NightPage', () => {
  beforeEach(() => vi.stubGlobal('EventSource', FakeEventSource));
  afterEach(() => vi.unstubAllGlobals());

  it('opens with the sentence of the night and shows its run with the most frames', async () => {
    const { page, plate } = await renderNight();
    expect(page.querySelector('h1')?.textContent.replace(/\s+/g, ' ').trim()).toBe(
      'The worm put 0.46″ into RA.',
    );
    expect(page.querySelector('.folio')?.textContent).toContain('28–29 November 2026');
    expect(plate('star')).toContain('Run 2, M 81');
    expect(plate('star')).toContain('2.61″ × 2.32″');
    expect(plate('star')).toContain('10° from RA toward Dec'); // 90° − 80°, DESIGN §6
  });

  it('says why instead of drawing empty axes', async () => {
    const { page, plate } = await renderNight();
    expect(plate('budget')).toContain('the parts cannot be told apart');
    expect(plate('worm')).toContain('1.2 were seen');
    expect(plate('spectrum')).toContain('too short for a spectrum');
    expect(page.querySelector('app-worm-dial, app-budget-ruler')).toBeNull();
  });

  it('sets a finding beside its figure, with its caution and its gain', async () => {
    const { page } = await renderNight();
    const note = page.querySelector('app-notes-of .note')!.textContent.replace(/\s+/g, ' ');
    expect(note).toContain('Act');
    expect(note).toContain('The worm puts 0.46″ into RA.');
    expect(note).toContain('Before you beginUnpower the mount');
    expect(note).toContain('RMS without it0.46″');
    expect(page.querySelector('app-tally')?.textContent).toContain('1 to act on');
  });

  it('lets all figures follow the run that is chosen', async () => {
    const { fixture, http, page, plate } = await renderNight();
    const button = [...page.querySelectorAll<HTMLElement>('app-run-table button')].find(
      (each) => each.textContent.trim() === 'M 33',
    )!;
    button.click();
    TestBed.tick();
    http.expectOne(byHandPaths.of(RIG, idOf(1))).flush(NOTHING_BY_HAND);
    await fixture.whenStable();
    expect(button.getAttribute('aria-pressed')).toBe('true');
    for (const name of ['star', 'budget', 'trace', 'spectrum', 'worm', 'mount']) {
      expect(plate(name)).toContain('Run 1, M 33');
    }
    expect(page.querySelector('app-notes-of .note')).toBeNull();
  });

  it('lists what was refused and what was set aside, and offers the file and the document', async () => {
    const { page, plate } = await renderNight();
    expect(plate('reading')).toContain('1 line refused in pier_2811.csv');
    expect(plate('reading')).toContain('line 812RA error is not a number');
    const links = [...page.querySelectorAll('app-reading-plate a')].map((a) =>
      a.getAttribute('href'),
    );
    expect(links).toEqual([
      `/api/v1/rigs/${RIG}/nights/${DATE}/archive`,
      `/api/v1/rigs/${RIG}/imports/${IMPORT}/original`,
      `/api/v1/rigs/${RIG}/imports/${IMPORT}/frames`,
      `/api/v1/rigs/${RIG}/imports/${IMPORT}/document`,
      `/rigs/${RIG}/import/${IMPORT}`,
    ]);
  });

  it('says so when there is no such night', async () => {
    TestBed.configureTestingModule({
      providers: [provideHttpClient(), provideHttpClientTesting(), provideRouter([])],
    });
    const fixture = TestBed.createComponent(NightPage);
    fixture.componentRef.setInput('rigId', RIG);
    fixture.componentRef.setInput('date', DATE);
    TestBed.tick();
    TestBed.inject(HttpTestingController).expectOne(setupPaths.all(RIG)).flush([]);
    TestBed.inject(HttpTestingController)
      .expectOne(nightPaths.one(RIG, DATE))
      .flush({ type: 'not-found' }, { status: 404, statusText: 'not found' });
    await fixture.whenStable();
    const page = fixture.nativeElement as HTMLElement;
    expect(page.querySelector('h1')?.textContent).toContain('This night is not here.');
    expect(page.querySelector('[role=alert]')).not.toBeNull();
  });
});

import { TestBed } from '@angular/core/testing';
import { NGX_ECHARTS_CONFIG } from 'ngx-echarts';
import { TraceChart } from './trace-chart';
import type { SecondsRange, TraceStretch } from './trace-stretch';

const blankChart = {
  setOption: () => undefined,
  resize: () => undefined,
  isDisposed: () => true,
};

function stretchOf(thinned: boolean): TraceStretch {
  const times = Float64Array.from({ length: 600 }, (_, i) => i * 2);
  const ra = Float32Array.from(times, (t) => (t === 100 ? 0.42 : -0.1));
  const dec = Float32Array.from(times, () => 0.25);
  return {
    fromSeconds: 0,
    toSeconds: 1200,
    thinned,
    timeSeconds: times,
    ra: { leastArcsec: ra, greatestArcsec: ra },
    dec: { leastArcsec: dec, greatestArcsec: dec },
    setAside: Uint8Array.from(times, (t) => (t >= 600 && t <= 620 ? 1 : 0)),
  };
}

async function renderTrace(thinned: boolean) {
  TestBed.overrideComponent(TraceChart, {
    set: {
      providers: [
        { provide: NGX_ECHARTS_CONFIG, useValue: { echarts: { init: () => blankChart } } },
      ],
    },
  });
  const fixture = TestBed.createComponent(TraceChart);
  const set = (name: string, value: unknown) => {
    fixture.componentRef.setInput(name, value);
  };
  set('label', 'RA 0.67″, Dec 0.44″ RMS');
  set('stretch', stretchOf(thinned));
  set('detail', null);
  set('durationSeconds', 1200);
  set('startMs', Date.UTC(2026, 10, 28, 20, 0, 0));
  set('timeZone', 'UTC');
  set('setAside', [{ fromSeconds: 600, toSeconds: 620, reason: 'dither' }]);
  set('halfRangeArcsec', 2.5);
  const wanted: SecondsRange[] = [];
  fixture.componentInstance.stretchWanted.subscribe((range) => wanted.push(range));
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  const button = (name: string) =>
    [...page.querySelectorAll('button')].find((each) => each.textContent.trim() === name)!;
  return { fixture, page, button, wanted };
}

describe('TraceChart', () => {
  beforeEach(() => {
    vi.useFakeTimers({ toFake: ['setTimeout', 'clearTimeout'] });
    vi.spyOn(HTMLCanvasElement.prototype, 'getContext').mockReturnValue(null); // jsdom has none
  });
  afterEach(() => {
    vi.useRealTimers();
    vi.restoreAllMocks();
  });

  it('reads a frame by keyboard, with its time at the site and whether it is kept', async () => {
    const { fixture, page } = await renderTrace(false);
    const slider = page.querySelector('[role=slider]')!;
    const press = async (key: string) => {
      slider.dispatchEvent(new KeyboardEvent('keydown', { key }));
      await fixture.whenStable();
      return slider.getAttribute('aria-valuetext');
    };
    expect(await press('ArrowRight')).toBe('20:00:00, RA \u22120.10″, Dec +0.25″, kept');
    for (let i = 0; i < 15; i += 1) await press('PageUp');
    expect(await press('ArrowRight')).toBe(
      '20:10:02, RA \u22120.10″, Dec +0.25″, set aside, dither',
    );
  });

  it('moves within what is in sight after a zoom', async () => {
    const { fixture, page, button } = await renderTrace(false);
    for (let i = 0; i < 3; i += 1) button('Closer').click();
    await fixture.whenStable();
    const slider = page.querySelector('[role=slider]')!;
    const timeAfter = async (key: string) => {
      slider.dispatchEvent(new KeyboardEvent('keydown', { key }));
      await fixture.whenStable();
      return slider.getAttribute('aria-valuetext')?.slice(0, 8);
    };
    // In sight: 150 s around the middle of 1200 s, from 525 to 675 s, a frame each 2 s.
    expect(await timeAfter('ArrowRight')).toBe('20:08:46');
    expect(await timeAfter('ArrowRight')).toBe('20:08:48');
    expect(await timeAfter('End')).toBe('20:11:14');
  });

  it('asks for a finer stretch when it is zoomed into thinned frames', async () => {
    const { fixture, button, wanted } = await renderTrace(true);
    button('Closer').click();
    button('Closer').click();
    await fixture.whenStable();
    vi.advanceTimersByTime(300);
    // A quarter of 1200 s around the middle, and half as much again to either side.
    expect(wanted).toEqual([{ fromSeconds: 300, toSeconds: 900 }]);
  });

  it('asks for nothing while it has the single frames', async () => {
    const { fixture, button, wanted } = await renderTrace(false);
    button('Closer').click();
    button('Closer').click();
    await fixture.whenStable();
    vi.advanceTimersByTime(300);
    expect(wanted).toEqual([]);
  });

  it('comes back to the whole run', async () => {
    const { fixture, page, button } = await renderTrace(false);
    expect(button('Whole run').disabled).toBe(true);
    button('Closer').click();
    await fixture.whenStable();
    expect(button('Whole run').disabled).toBe(false);
    button('Whole run').click();
    await fixture.whenStable();
    expect(page.querySelector('[role=slider]')?.getAttribute('aria-valuemax')).toBe('1200');
  });
});

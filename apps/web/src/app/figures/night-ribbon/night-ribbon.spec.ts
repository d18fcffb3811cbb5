import { TestBed } from '@angular/core/testing';
import { NightRibbon } from './night-ribbon';
import type { RibbonRun } from './ribbon-night';

const START = Date.UTC(2026, 10, 28, 20);
const HOUR = 3_600_000;

function runOf(id: string, startMs: number): RibbonRun {
  return {
    id,
    name: `Target ${id}`,
    totalRmsArcsec: 0.81,
    startMs,
    durationSeconds: 7200,
    stretch: null,
    setAside: [
      { fromSeconds: 100, toSeconds: 120, reason: 'dither' },
      { fromSeconds: 3000, toSeconds: 3780, reason: 'star lost' },
    ],
    subs: {
      lengthSeconds: 300,
      keepAspect: 1.15,
      aspects: [1.05, 1.22],
      startsSeconds: [0, 300],
    },
  };
}

async function renderRibbon(runs: RibbonRun[]) {
  const fixture = TestBed.createComponent(NightRibbon);
  const set = (name: string, value: unknown) => {
    fixture.componentRef.setInput(name, value);
  };
  set('label', '1 of 2 subs within the keep limit.');
  set('runs', runs);
  set('skies', []);
  set('selectedId', 'b');
  set('fromMs', START - HOUR);
  set('toMs', START + 6 * HOUR);
  set('timeZone', 'UTC');
  await fixture.whenStable();
  const page = fixture.nativeElement as HTMLElement;
  return { fixture, page, count: (selector: string) => page.querySelectorAll(selector).length };
}

describe('NightRibbon', () => {
  it('draws runs, dithers, lost stars and subs over the limit', async () => {
    const { page, count } = await renderRibbon([runOf('a', START), runOf('b', START + 3 * HOUR)]);
    expect(count('.ink-2')).toBe(2); // a tick for each dither
    expect(count('.patterned')).toBe(2); // hatching for each lost star
    expect(count('rect.sub')).toBe(2);
    expect(count('rect.sub-over')).toBe(2);
    expect(count('path.sub-over')).toBe(2); // the triangle: not by colour alone
    expect(count('.bracket')).toBe(1);
    expect(page.querySelector('text.name.strong')?.textContent).toBe('Target b');
    expect(page.textContent).toContain('keep limit 1.15');
  });

  it('labels the hours of the site', async () => {
    const { page } = await renderRibbon([runOf('a', START)]);
    const hours = [...page.querySelectorAll('text.axis')].map((each) => each.textContent);
    expect(hours).toContain('20:00');
    expect(hours).toContain('02:00');
  });

  it('selects the run that is pointed at', async () => {
    const { fixture, page } = await renderRibbon([runOf('a', START), runOf('b', START + 3 * HOUR)]);
    const selected: string[] = [];
    fixture.componentInstance.runSelected.subscribe((id) => selected.push(id));
    // 2 h of 7 h along the axis from 44 to 920 px: in the first hour of run a.
    const click = new MouseEvent('click', { clientX: 44 + (2 / 7) * 876, bubbles: true });
    page.querySelector('app-drawing')!.dispatchEvent(click);
    expect(selected).toEqual(['a']);
  });
});

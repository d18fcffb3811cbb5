import { TestBed } from '@angular/core/testing';
import { NGX_ECHARTS_CONFIG } from 'ngx-echarts';
import { SpectrumChart } from './spectrum-chart';

// jsdom has no canvas: the drawing itself is looked at in the browser tests.
const blankChart = {
  setOption: () => undefined,
  resize: () => undefined,
  isDisposed: () => true,
};

async function renderSpectrum() {
  TestBed.overrideComponent(SpectrumChart, {
    set: {
      providers: [
        { provide: NGX_ECHARTS_CONFIG, useValue: { echarts: { init: () => blankChart } } },
      ],
    },
  });
  const fixture = TestBed.createComponent(SpectrumChart);
  fixture.componentRef.setInput('label', 'The worm period of 480 s leads with 0.52″.');
  fixture.componentRef.setInput('curve', {
    periodSeconds: [10, 34.3, 100, 240, 480, 1000],
    raAmplitudeArcsec: [0.02, 0.14, 0.03, 0.41, 0.52, 0.02],
    decAmplitudeArcsec: [0.02, 0.03, 0.02, 0.03, 0.02, 0.02],
  });
  const peak = { axis: 'RA', share: 0.3 };
  fixture.componentRef.setInput('peaks', [
    { ...peak, periodSeconds: 480, amplitudeArcsec: 0.52, label: 'worm' },
    { ...peak, periodSeconds: 240, amplitudeArcsec: 0.41, label: 'worm / 2' },
    { ...peak, periodSeconds: 34.3, amplitudeArcsec: 0.14, label: null },
    { ...peak, periodSeconds: 2000, amplitudeArcsec: 0.9, label: null },
  ]);
  fixture.componentRef.setInput('topArcsec', null);
  await fixture.whenStable();
  return { fixture, page: fixture.nativeElement as HTMLElement };
}

const textsOf = (page: HTMLElement, selector: string) =>
  [...page.querySelectorAll(selector)].map((text) => text.textContent.trim().replace(/\s/g, ' '));

describe('SpectrumChart', () => {
  it('names the peaks that are in sight, the strongest first', async () => {
    const { page } = await renderSpectrum();
    expect(textsOf(page, '.name')).toEqual(['worm', 'worm ÷ 2', 'not named']);
    expect(textsOf(page, 'svg .axis')).toEqual(['480 s 0.52″', '240 s 0.41″', '34.3 s 0.14″']);
  });

  it('says its result to those who cannot see it', async () => {
    const { page } = await renderSpectrum();
    expect(page.querySelector('[role=img]')?.getAttribute('aria-label')).toContain('480 s');
  });

  it('reads values by keyboard', async () => {
    const { fixture, page } = await renderSpectrum();
    const slider = page.querySelector('[role=slider]')!;
    slider.dispatchEvent(new KeyboardEvent('keydown', { key: 'End' }));
    slider.dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowLeft' }));
    await fixture.whenStable();
    expect(slider.getAttribute('aria-valuetext')?.replace(/\s/g, ' ')).toBe(
      '480 s, RA 0.52″, Dec 0.02″',
    );
  });
});

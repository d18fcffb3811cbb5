import { TestBed } from '@angular/core/testing';
import { Roundel } from './roundel';
import { RoundelGlyph } from './roundel-glyph';

const STAR = {
  fwhmMajorArcsec: 2.61,
  fwhmMinorArcsec: 2.32,
  aspect: 1.125,
  positionAngleDegrees: 80,
};

async function renderRoundel(imagingScaleArcsecPerPx: number | null) {
  const fixture = TestBed.createComponent(Roundel);
  fixture.componentRef.setInput('star', STAR);
  fixture.componentRef.setInput('seeingFwhmArcsec', 2.1);
  fixture.componentRef.setInput('imagingScaleArcsecPerPx', imagingScaleArcsecPerPx);
  fixture.componentRef.setInput('halfWidthArcsec', 2);
  await fixture.whenStable();
  return fixture.nativeElement as HTMLElement;
}

describe('Roundel', () => {
  it('says the result, not the form', async () => {
    const page = await renderRoundel(0.97);
    expect(page.querySelector('svg[role=img]')?.getAttribute('aria-label')).toBe(
      'Predicted star 2.61″ by 2.32″, aspect ratio 1.13, long axis 10° from RA toward Dec, seeing disc 2.10″.',
    );
  });

  it('draws the star at its true size in the frame of 2″', async () => {
    const page = await renderRoundel(0.97);
    const ellipse = page.querySelector('ellipse')!;
    // The rim of 98 px is 2″: 49 px an arcsecond, half of each FWHM (DESIGN §6).
    expect(Number(ellipse.getAttribute('rx'))).toBeCloseTo((2.61 / 2) * 49, 6);
    expect(Number(ellipse.getAttribute('ry'))).toBeCloseTo((2.32 / 2) * 49, 6);
  });

  it('centres a camera pixel on the star', async () => {
    const page = await renderRoundel(1);
    const edges = [...page.querySelectorAll('.pixel')]
      .map((line) => Number(line.getAttribute('x1')))
      .filter((x) => x > 0);
    expect(edges).toEqual([46.5, 95.5, 144.5, 193.5]); // 120 ± 24.5, ± 73.5 at 49 px a pixel
  });

  it('draws no pixels when the scale is not known', async () => {
    const page = await renderRoundel(null);
    expect(page.querySelectorAll('.pixel')).toHaveLength(0);
  });
});

describe('RoundelGlyph', () => {
  it('draws elongation three times as strong', async () => {
    const fixture = TestBed.createComponent(RoundelGlyph);
    fixture.componentRef.setInput('aspect', 1.1);
    fixture.componentRef.setInput('positionAngleDegrees', 90);
    await fixture.whenStable();
    const ellipse = (fixture.nativeElement as HTMLElement).querySelector('ellipse')!;
    const drawn = Number(ellipse.getAttribute('rx')) / Number(ellipse.getAttribute('ry'));
    expect(drawn).toBeCloseTo(1.3, 9); // 1 + 3(a − 1), DESIGN §6
  });

  it('holds a very long star inside its ticks', async () => {
    const fixture = TestBed.createComponent(RoundelGlyph);
    fixture.componentRef.setInput('aspect', 3);
    fixture.componentRef.setInput('positionAngleDegrees', 0);
    await fixture.whenStable();
    const ellipse = (fixture.nativeElement as HTMLElement).querySelector('ellipse')!;
    expect(Number(ellipse.getAttribute('rx'))).toBeLessThanOrEqual(8);
  });
});

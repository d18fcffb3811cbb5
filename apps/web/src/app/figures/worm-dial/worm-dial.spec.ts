import { TestBed } from '@angular/core/testing';
import { dialReachArcsec, dialShapes, ringStepArcsec, type DialBin } from './dial-shapes';
import { WormDial } from './worm-dial';

const sine = (amplitudeArcsec: number): DialBin[] =>
  Array.from({ length: 72 }, (_, i) => {
    const medianArcsec = amplitudeArcsec * Math.sin((2 * Math.PI * i) / 72);
    return {
      phase: i / 72,
      medianArcsec,
      q1Arcsec: medianArcsec - 0.5,
      q3Arcsec: medianArcsec + 0.5,
    };
  });

describe('dial shapes', () => {
  it('reach to the next ring of 5″', () => {
    expect([2, 9, 9.6].map((amplitude) => dialReachArcsec(sine(amplitude)))).toEqual([5, 10, 15]);
  });

  it('set the rings wider apart for a mount that swings far', () => {
    expect([5, 20, 45].map(ringStepArcsec)).toEqual([5, 5, 15]);
  });

  it('put phase 0 at the top and a quarter turn at the right', () => {
    const median = dialShapes(sine(5), 340).find((shape) => shape.look === 'median');
    const d = median?.kind === 'path' ? median.d : '';
    const points = d.slice(1, -1).split('L');
    const [x0, y0] = points[0]!.split(' ').map(Number);
    const [x18, y18] = points[18]!.split(' ').map(Number);
    expect(x0).toBeCloseTo(170, 1);
    expect(y0).toBeCloseTo(170 - 0.265 * 340, 1); // on the zero circle, DESIGN §6
    expect(y18).toBeCloseTo(170, 1);
    expect(x18! - 170).toBeGreaterThan(0.265 * 340);
  });

  it('leave out bins without frames', () => {
    const bins = sine(5).map((bin, i) =>
      i === 0 ? { ...bin, medianArcsec: null, q1Arcsec: null, q3Arcsec: null } : bin,
    );
    const median = dialShapes(bins, 340).find((shape) => shape.look === 'median');
    expect(median?.kind === 'path' ? median.d.split('L') : []).toHaveLength(71);
  });
});

describe('WormDial', () => {
  it('says its rings and its result', async () => {
    const fixture = TestBed.createComponent(WormDial);
    fixture.componentRef.setInput('bins', sine(9));
    fixture.componentRef.setInput('label', 'Periodic error 18.0″ peak to peak over 480 s.');
    await fixture.whenStable();
    const page = fixture.nativeElement as HTMLElement;
    expect(page.querySelector('svg')?.getAttribute('aria-label')).toContain('18.0″');
    expect(page.querySelector('.caption')?.textContent).toContain('5″ apart');
  });
});

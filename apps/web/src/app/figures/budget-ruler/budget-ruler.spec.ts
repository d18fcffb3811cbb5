import { TestBed } from '@angular/core/testing';
import { BudgetRuler } from './budget-ruler';
import { placeParts, type AxisBudget } from './budget-parts';

// Shares of a mean square of 1: sizes and 'leaves' follow as √share and √(1 − share).
const part = (name: string, share: number) => ({
  part: name,
  share,
  rmsArcsec: Math.sqrt(share),
  rmsIfCuredArcsec: Math.sqrt(1 - share),
});
const RA: AxisBudget = {
  rmsAboutLockArcsec: 1,
  parts: [
    part('seeing floor', 0.36),
    part('periodic error', 0.49),
    part('drift', 0.001),
    part('unexplained', 0.149),
  ],
};
const DEC: AxisBudget = { rmsAboutLockArcsec: 0.4, parts: [part('seeing floor', 1)] };

describe('placeParts', () => {
  it('keeps the fixed order, each part beginning where the last one ended', () => {
    const placed = placeParts(RA).filter((each) => each.seen);
    expect(placed.map((each) => [each.name, Number(each.from.toFixed(3))])).toEqual([
      ['periodic error', 0],
      ['seeing floor', 0.491],
      ['unexplained', 0.851],
    ]);
  });
});

describe('BudgetRuler', () => {
  async function renderBudget() {
    const fixture = TestBed.createComponent(BudgetRuler);
    fixture.componentRef.setInput('ra', RA);
    fixture.componentRef.setInput('dec', DEC);
    await fixture.whenStable();
    return fixture.nativeElement as HTMLElement;
  }

  it('says the largest part of each axis', async () => {
    const page = await renderBudget();
    const label = page.querySelector('svg')?.getAttribute('aria-label')?.replace(/\s/g, ' ');
    expect(label).toBe(
      'RA: periodic error is the largest part, 49 % of the mean square. Dec: seeing floor is the largest part, 100 % of the mean square.',
    );
  });

  it('says "none seen" instead of a zero', async () => {
    const page = await renderBudget();
    const texts = [...page.querySelectorAll('text')].map((each) => each.textContent);
    expect(texts.filter((each) => each === 'none seen')).toHaveLength(10); // 4 of RA, 6 of Dec
    expect(texts).toContain('leaves 0.71″'); // √(1 − 0.49)
  });
});

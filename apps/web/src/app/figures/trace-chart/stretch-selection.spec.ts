import { TestBed } from '@angular/core/testing';
import { StretchSelection } from './stretch-selection';

/** A plot of 100 px for 1000 s, 40 px from the left. */
function showSelection(inputs: Record<string, unknown>) {
  const fixture = TestBed.createComponent(StretchSelection);
  const all = {
    sight: { fromSeconds: 2000, toSeconds: 3000 },
    leftPx: 40,
    plotPx: 100,
    heightPx: 200,
    active: true,
    selection: null,
    ...inputs,
  };
  for (const [name, value] of Object.entries(all)) fixture.componentRef.setInput(name, value);
  const selected = vi.fn();
  fixture.componentInstance.selected.subscribe(selected);
  TestBed.tick();
  const page = fixture.nativeElement as HTMLElement;
  const drag = (...xs: number[]) => {
    const surface = page.querySelector<HTMLElement>('.catch')!;
    surface.setPointerCapture = vi.fn(); // jsdom has none
    xs.forEach((clientX, i) => {
      surface.dispatchEvent(new MouseEvent(i === 0 ? 'pointerdown' : 'pointermove', { clientX }));
    });
    surface.dispatchEvent(new MouseEvent('pointerup'));
    TestBed.tick();
  };
  return { page, drag, selected };
}

describe('StretchSelection', () => {
  it('selects what is dragged over, in either direction', () => {
    const { drag, selected } = showSelection({});
    drag(60, 90);
    expect(selected).toHaveBeenLastCalledWith({ fromSeconds: 2200, toSeconds: 2500 });
    drag(90, 70, 60);
    expect(selected).toHaveBeenLastCalledWith({ fromSeconds: 2200, toSeconds: 2500 });
  });

  it('ends at the edge of what is in sight', () => {
    const { drag, selected } = showSelection({});
    drag(90, 500);
    expect(selected).toHaveBeenLastCalledWith({ fromSeconds: 2500, toSeconds: 3000 });
  });

  it('takes a slip for no selection', () => {
    const { drag, selected } = showSelection({});
    drag(90, 92);
    expect(selected).not.toHaveBeenCalled();
  });

  it('draws the part of a selection that is in sight, and leaves the plot to the pointer', () => {
    const selection = { fromSeconds: 1000, toSeconds: 2500 };
    const { page } = showSelection({ selection, active: false });
    const { style } = page.querySelector<HTMLElement>('.band')!;
    expect([style.insetInlineStart, style.inlineSize]).toEqual(['40px', '50px']);
    expect(page.querySelector('.catch')).toBeNull();
  });

  it('draws nothing of a selection that is out of sight', () => {
    const selection = { fromSeconds: 0, toSeconds: 900 };
    expect(showSelection({ selection }).page.querySelector('.band')).toBeNull();
  });
});

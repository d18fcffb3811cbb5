import { DestroyRef, ElementRef, inject, signal, type Signal } from '@angular/core';

/**
 * Width of the component's own element in whole pixels, followed as it changes. Before the first layout it is
 * `initialPx`, so that a figure never draws onto nothing.
 */
export function elementWidthPx(initialPx: number): Signal<number> {
  const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
  const widthPx = signal(initialPx);
  const observer = new ResizeObserver(([entry]) => {
    const measured = Math.floor(entry?.contentRect.width ?? 0);
    if (measured > 0) widthPx.set(measured);
  });
  observer.observe(element);
  inject(DestroyRef).onDestroy(() => {
    observer.disconnect();
  });
  return widthPx.asReadonly();
}

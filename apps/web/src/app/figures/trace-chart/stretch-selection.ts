import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { SecondsRange } from './trace-stretch';

/** A shorter drag is a click that slipped. */
const SHORTEST_PX = 4;

/** Lies over a plot against time: draws the stretch that is selected and, while active, lets it be dragged out. */
@Component({
  selector: 'app-stretch-selection',
  template: `
    @if (active()) {
      <div
        class="catch"
        (pointerdown)="begin($event)"
        (pointermove)="follow($event)"
        (pointerup)="end()"
        (pointercancel)="dragged.set(null)"
      ></div>
    }
    @if (band(); as at) {
      <div
        class="band"
        [style.inset-inline-start.px]="at.leftPx"
        [style.inline-size.px]="at.widthPx"
        [style.block-size.px]="heightPx()"
      ></div>
    }
  `,
  styles: `
    .catch {
      position: absolute;
      inset: 0;
      cursor: crosshair;
      touch-action: none;
    }
    .band {
      position: absolute;
      top: 0;
      border-inline: 2px solid var(--mark);
      border-top: 6px solid var(--mark);
      pointer-events: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StretchSelection {
  readonly sight = input.required<SecondsRange>();
  readonly leftPx = input.required<number>();
  readonly plotPx = input.required<number>();
  readonly heightPx = input.required<number>();
  readonly active = input.required<boolean>();
  readonly selection = input.required<SecondsRange | null>();
  readonly selected = output<SecondsRange>();

  /** From where the pointer went down to where it is. */
  protected readonly dragged = signal<{ readonly from: number; readonly to: number } | null>(null);
  private readonly secondsPerPx = computed(
    () => (this.sight().toSeconds - this.sight().fromSeconds) / this.plotPx(),
  );

  protected readonly band = computed(() => {
    const range = this.draggedRange() ?? this.selection();
    const { fromSeconds, toSeconds } = this.sight();
    if (!range || range.toSeconds < fromSeconds || range.fromSeconds > toSeconds) return null;
    const from = Math.max(range.fromSeconds, fromSeconds);
    const to = Math.min(range.toSeconds, toSeconds);
    return {
      leftPx: this.leftPx() + (from - fromSeconds) / this.secondsPerPx(),
      widthPx: Math.max(SHORTEST_PX, (to - from) / this.secondsPerPx()),
    };
  });

  protected begin(event: PointerEvent): void {
    const seconds = this.secondsAt(event);
    (event.currentTarget as HTMLElement).setPointerCapture(event.pointerId);
    this.dragged.set({ from: seconds, to: seconds });
  }

  protected follow(event: PointerEvent): void {
    const seconds = this.secondsAt(event);
    this.dragged.update((drag) => drag && { ...drag, to: seconds });
  }

  protected end(): void {
    const range = this.draggedRange();
    this.dragged.set(null);
    if (range && range.toSeconds - range.fromSeconds > SHORTEST_PX * this.secondsPerPx()) {
      this.selected.emit(range);
    }
  }

  private readonly draggedRange = computed((): SecondsRange | null => {
    const drag = this.dragged();
    return (
      drag && {
        fromSeconds: Math.min(drag.from, drag.to),
        toSeconds: Math.max(drag.from, drag.to),
      }
    );
  });

  private secondsAt(event: PointerEvent): number {
    const box = (event.currentTarget as HTMLElement).getBoundingClientRect();
    const { fromSeconds, toSeconds } = this.sight();
    const seconds = fromSeconds + (event.clientX - box.left - this.leftPx()) * this.secondsPerPx();
    return Math.min(toSeconds, Math.max(fromSeconds, seconds));
  }
}

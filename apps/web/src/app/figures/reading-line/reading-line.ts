import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

const STEPS: Record<string, number> = {
  ArrowLeft: -1,
  ArrowDown: -1,
  ArrowRight: 1,
  ArrowUp: 1,
  PageDown: -20,
  PageUp: 20,
  Home: -Infinity,
  End: Infinity,
};

/**
 * The upright line over a plot at which its values are read: a slider for keyboard and screen reader. It lies over the
 * plot and lets the pointer through; the plot itself follows the pointer.
 */
@Component({
  selector: 'app-reading-line',
  template: `
    <div
      class="slider"
      role="slider"
      tabindex="0"
      [attr.aria-label]="'Reading line over ' + of() + ', moved by the arrow keys'"
      [attr.aria-valuemin]="from()"
      [attr.aria-valuemax]="to()"
      [attr.aria-valuenow]="at()"
      [attr.aria-valuetext]="text() ?? 'not set'"
      (keydown)="follow($event)"
    ></div>
    @if (atPx(); as px) {
      <div class="line" [style.inset-inline-start.px]="px" [style.block-size.px]="heightPx()"></div>
    }
  `,
  styles: `
    .slider {
      position: absolute;
      inset: 0;
      pointer-events: none;
    }
    .line {
      position: absolute;
      top: 0;
      border-left: 1px solid var(--ink);
      pointer-events: none;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingLine {
  readonly of = input.required<string>();
  readonly atPx = input.required<number | null>();
  readonly heightPx = input.required<number>();
  readonly text = input.required<string | null>();
  readonly from = input.required<number>();
  readonly to = input.required<number>();
  readonly at = input.required<number>();
  /** By so many values to the right; ±Infinity is the end. */
  readonly moved = output<number>();

  protected follow(event: KeyboardEvent): void {
    const step = STEPS[event.key];
    if (step === undefined) return;
    event.preventDefault();
    this.moved.emit(step);
  }
}

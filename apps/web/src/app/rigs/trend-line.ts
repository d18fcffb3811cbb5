import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { arcsecText } from '../figures/measure-text';

const WIDTH_PX = 136;
const HEIGHT_PX = 30;
const EDGE_PX = 4;

/** The last values of a measure as a thin line, the last one as a dot. */
@Component({
  selector: 'app-trend-line',
  template: `
    <svg [attr.width]="width" [attr.height]="height" role="img" [attr.aria-label]="label()">
      <polyline [attr.points]="points()" />
      <circle r="2.6" [attr.cx]="last().x" [attr.cy]="last().y" />
    </svg>
  `,
  styles: `
    svg {
      display: block;
    }
    polyline {
      fill: none;
      stroke: var(--ink-2);
      stroke-width: 1.3;
    }
    circle {
      fill: var(--ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TrendLine {
  /** Total RMS in arcseconds, oldest first; two or more. */
  readonly values = input.required<readonly number[]>();

  protected readonly width = WIDTH_PX;
  protected readonly height = HEIGHT_PX;
  private readonly places = computed(() => {
    const values = this.values();
    const least = Math.min(...values);
    const span = Math.max(...values) - least || 1;
    return values.map((value, i) => ({
      x: EDGE_PX + (i / (values.length - 1)) * (WIDTH_PX - 2 * EDGE_PX),
      y: HEIGHT_PX - EDGE_PX - ((value - least) / span) * (HEIGHT_PX - 2 * EDGE_PX),
    }));
  });
  protected readonly points = computed(() =>
    this.places()
      .map(({ x, y }) => `${x.toFixed(1)},${y.toFixed(1)}`)
      .join(' '),
  );
  protected readonly last = computed(() => this.places().at(-1) ?? { x: 0, y: 0 });
  protected readonly label = computed(() => {
    const values = this.values();
    return `Total RMS over the last ${values.length} nights, from ${arcsecText(values[0] ?? null)} to ${arcsecText(values.at(-1) ?? null)}`;
  });
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { NightSummary } from '@stillpier/contract';
import { Drawing } from '../figures/drawing/drawing';
import { line, rect, text, type Shape } from '../figures/drawing/shapes';
import { elementWidthPx } from '../figures/element-width';
import { countedText } from '../figures/measure-text';

const DAY_MS = 86_400_000;
const HEIGHT_PX = 74;
const BASE_PX = 52;
const PX_PER_HOUR = 3.6;
const MOST_HOURS = 14;
const MONTHS = 12;

/** Twelve months up to the last night: a bar for each night, as high as its hours. */
@Component({
  selector: 'app-year-strip',
  imports: [Drawing],
  template: `
    <app-drawing
      [label]="label()"
      [widthPx]="widthPx()"
      [heightPx]="heightPx"
      [shapes]="shapes()"
    />
    <p class="caption">
      A bar for each night, as high as the hours guided, over the twelve months up to the last one.
    </p>
  `,
  styles: `
    :host {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class YearStrip {
  readonly nights = input.required<readonly NightSummary[]>();

  protected readonly widthPx = elementWidthPx(920);
  protected readonly heightPx = HEIGHT_PX;

  private readonly months = computed(() => {
    const last = this.nights().reduce((latest, { date }) => (date > latest ? date : latest), '');
    const [year = 0, month = 0] = last.split('-').map(Number);
    // One more than twelve: the end of the last month.
    return Array.from({ length: MONTHS + 1 }, (_, i) => Date.UTC(year, month - MONTHS + i, 1));
  });
  private readonly inSight = computed(() => {
    const [from = 0] = this.months();
    return this.nights().filter((night) => Date.parse(night.date) >= from);
  });
  protected readonly label = computed(
    () => `${countedText(this.inSight().length, 'night', 'nights')} in the last twelve months.`,
  );

  protected readonly shapes = computed((): Shape[] => {
    const months = this.months();
    const from = months[0] ?? 0;
    const to = months.at(-1) ?? from + 1;
    const pxPerDay = (this.widthPx() * DAY_MS) / (to - from);
    const x = (ms: number): number => ((ms - from) / (to - from)) * this.widthPx();
    return [
      ...months
        .slice(0, -1)
        .flatMap((ms) => [
          line(x(ms), BASE_PX, x(ms), BASE_PX + 5, 'base'),
          ...(this.widthPx() > 560 || new Date(ms).getUTCMonth() % 3 === 0
            ? [text(x(ms) + 4, BASE_PX + 17, monthText(ms), 'axis')]
            : []),
        ]),
      line(0, BASE_PX, this.widthPx(), BASE_PX, 'base'),
      ...this.inSight().map((night) => {
        const height = Math.max(2, Math.min(MOST_HOURS, night.guidedHours) * PX_PER_HOUR);
        const width = Math.max(1, pxPerDay - 0.6);
        return rect(x(Date.parse(night.date)), BASE_PX - height, width, height, 'ink-solid');
      }),
    ];
  });
}

function monthText(ms: number): string {
  const month = new Date(ms).toLocaleDateString('en-GB', { month: 'short', timeZone: 'UTC' });
  return new Date(ms).getUTCMonth() === 0 ? `${month} ${new Date(ms).getUTCFullYear()}` : month;
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Drawing } from '../drawing/drawing';
import { elementWidthPx } from '../element-width';
import { FigureKey, type KeyOfNote } from '../figure-key/figure-key';
import { FigureTable, type FigureColumn } from '../figure-table/figure-table';
import { arcsecText, percentText } from '../measure-text';
import { placeParts, titleOf, type Axis, type AxisBudget, type PartName } from './budget-parts';
import {
  FACING_HEIGHT_PX,
  facingKeyPoint,
  facingRulers,
  SINGLE_HEIGHT_PX,
  singleRuler,
  swatch,
} from './ruler-shapes';

const FACING_FROM_PX = 720;

/** A key at a part of one axis. */
export interface BudgetKey extends KeyOfNote {
  readonly axis: Axis;
  readonly part: PartName;
}

/** What the error of each axis is made of, as parts of its mean square. */
@Component({
  selector: 'app-budget-ruler',
  imports: [Drawing, FigureKey, FigureTable],
  templateUrl: './budget-ruler.html',
  styleUrl: './budget-ruler.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BudgetRuler {
  readonly ra = input.required<AxisBudget>();
  readonly dec = input.required<AxisBudget>();
  readonly keys = input<readonly BudgetKey[]>([]);

  protected readonly widthPx = elementWidthPx(920);
  protected readonly facing = computed(() => this.widthPx() >= FACING_FROM_PX);
  protected readonly facingHeightPx = FACING_HEIGHT_PX;
  protected readonly singleHeightPx = SINGLE_HEIGHT_PX;
  protected readonly facingShapes = computed(() =>
    facingRulers(this.ra(), this.dec(), this.widthPx()),
  );
  protected readonly facingKeys = computed(() =>
    this.keys().map((key) => ({ ...key, at: facingKeyPoint(key, this.widthPx()) })),
  );
  protected readonly label = computed(
    () => `${largestOf('RA', this.ra())} ${largestOf('Dec', this.dec())}`,
  );

  protected readonly singles = computed(() =>
    (['ra', 'dec'] as const).map((axis) => {
      const budget = axis === 'ra' ? this.ra() : this.dec();
      const name = axis === 'ra' ? 'RA' : 'Dec';
      return {
        axis,
        name,
        rms: arcsecText(budget.rmsAboutLockArcsec),
        label: largestOf(name, budget),
        shapes: singleRuler(axis, budget, this.widthPx()),
        rows: bySize(budget).map((part) => ({
          name: titleOf(part.name),
          size: arcsecText(part.rmsArcsec),
          leaves: arcsecText(part.rmsIfCuredArcsec),
          swatch: swatch(part, axis),
          keys: this.keys().filter((key) => key.axis === axis && key.part === part.name),
        })),
      };
    }),
  );

  protected readonly tableColumns: readonly FigureColumn[] = [
    { head: 'Part', numeric: false },
    { head: 'Axis', numeric: false },
    { head: 'Share', numeric: true },
    { head: 'Size, RMS', numeric: true },
    { head: 'RMS if cured', numeric: true },
  ];
  protected readonly tableRows = computed(() =>
    (['ra', 'dec'] as const satisfies readonly Axis[]).flatMap((axis) =>
      placeParts(axis === 'ra' ? this.ra() : this.dec()).map((part) => [
        titleOf(part.name),
        axis === 'ra' ? 'RA' : 'Dec',
        percentText(part.share),
        part.seen ? arcsecText(part.rmsArcsec) : 'none seen',
        arcsecText(part.rmsIfCuredArcsec),
      ]),
    ),
  );
}

function bySize(budget: AxisBudget) {
  return placeParts(budget)
    .filter((part) => part.seen)
    .sort((a, b) => b.share - a.share);
}

function largestOf(axisName: string, budget: AxisBudget): string {
  const [largest] = bySize(budget);
  return largest
    ? `${axisName}: ${titleOf(largest.name).toLowerCase()} is the largest part, ${percentText(largest.share)} of the mean square.`
    : `${axisName}: no part was seen.`;
}

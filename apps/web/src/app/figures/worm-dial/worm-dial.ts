import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { Drawing } from '../drawing/drawing';
import { FigureKey, type KeyOfNote } from '../figure-key/figure-key';
import { FigureTable, type FigureColumn } from '../figure-table/figure-table';
import { NO_VALUE, signedArcsecText } from '../measure-text';
import { dialReachArcsec, dialShapes, ringStepArcsec, type DialBin } from './dial-shapes';

const SIZE_PX = 340;

/** The periodic error over one turn of the worm, corrections undone. */
@Component({
  selector: 'app-worm-dial',
  imports: [Drawing, FigureKey, FigureTable],
  template: `
    <app-drawing [label]="label()" [widthPx]="sizePx" [heightPx]="sizePx" [shapes]="shapes()">
      @for (placed of placedKeys(); track placed.key.letter) {
        <app-figure-key [key]="placed.key" [at]="placed.at" />
      }
    </app-drawing>
    <p class="caption">
      Rings are {{ ringStep() }}″ apart, outwards is positive; the solid circle is zero.
    </p>
    <app-figure-table of="One turn of the worm" [columns]="tableColumns" [rows]="tableRows()" />
  `,
  styles: `
    :host {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WormDial {
  readonly bins = input.required<readonly DialBin[]>();
  /** Says the result. */
  readonly label = input.required<string>();
  readonly keys = input<readonly KeyOfNote[]>([]);

  protected readonly sizePx = SIZE_PX;
  protected readonly shapes = computed(() => dialShapes(this.bins(), SIZE_PX));
  /** In the middle, where nothing is drawn. */
  protected readonly placedKeys = computed(() =>
    this.keys().map((key, i) => ({ key, at: { xPx: SIZE_PX / 2, yPx: SIZE_PX / 2 + 22 * i } })),
  );
  protected readonly ringStep = computed(() => ringStepArcsec(dialReachArcsec(this.bins())));

  protected readonly tableColumns: readonly FigureColumn[] = [
    { head: 'Part of a turn', numeric: true },
    { head: 'Lower quarter', numeric: true },
    { head: 'Median', numeric: true },
    { head: 'Upper quarter', numeric: true },
  ];
  protected readonly tableRows = computed(() =>
    this.bins().map((bin) => [
      bin.phase.toFixed(3),
      ...[bin.q1Arcsec, bin.medianArcsec, bin.q3Arcsec].map((value) =>
        value === null ? NO_VALUE : signedArcsecText(value),
      ),
    ]),
  );
}

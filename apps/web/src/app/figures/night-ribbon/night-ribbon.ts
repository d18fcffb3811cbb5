import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { clockText } from '../clock';
import { Drawing } from '../drawing/drawing';
import { elementWidthPx } from '../element-width';
import { FigureKey, type KeyOfNote } from '../figure-key/figure-key';
import { FigureTable, type FigureColumn } from '../figure-table/figure-table';
import { ratioText } from '../measure-text';
import { endMs, subCells, type RibbonRun } from './ribbon-night';
import type { RibbonSky } from './ribbon-sky';
import { tallKeyPoint, tallRibbon, tallTimeScale } from './tall-ribbon';
import { timeScale, wideKeyPoint, wideRibbon, type RibbonView } from './wide-ribbon';

const TALL_BELOW_PX = 560;

/** A key at an instant of the night. */
export interface RibbonKey extends KeyOfNote {
  readonly atMs: number;
}

/** The night on one time axis: how wide the error ran, what was set aside, and the subs that it would have cost. */
@Component({
  selector: 'app-night-ribbon',
  imports: [Drawing, FigureKey, FigureTable],
  template: `
    <app-drawing
      [label]="label()"
      [widthPx]="view().widthPx"
      [heightPx]="drawing().heightPx"
      [shapes]="drawing().shapes"
      (click)="select($event)"
    >
      @for (key of placedKeys(); track key.letter) {
        <app-figure-key [key]="key" [at]="key.at" />
      }
    </app-drawing>
    <app-figure-table of="Subs of the night" [columns]="tableColumns" [rows]="tableRows()" />
  `,
  styles: `
    :host {
      display: block;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NightRibbon {
  /** Says the result. */
  readonly label = input.required<string>();
  readonly runs = input.required<readonly RibbonRun[]>();
  /** Empty where the site is not known. */
  readonly skies = input.required<readonly RibbonSky[]>();
  readonly selectedId = input.required<string | null>();
  readonly fromMs = input.required<number>();
  readonly toMs = input.required<number>();
  readonly timeZone = input.required<string>();
  readonly keys = input<readonly RibbonKey[]>([]);
  /** For the pointer; pages offer the runs as buttons too. */
  readonly runSelected = output<string>();

  private readonly widthPx = elementWidthPx(920);
  private readonly tall = computed(() => this.widthPx() < TALL_BELOW_PX);
  protected readonly view = computed((): RibbonView => ({
    runs: this.runs(),
    skies: this.skies(),
    selectedId: this.selectedId(),
    fromMs: this.fromMs(),
    toMs: this.toMs(),
    timeZone: this.timeZone(),
    widthPx: this.widthPx(),
  }));
  protected readonly drawing = computed(() =>
    this.tall() ? tallRibbon(this.view()) : wideRibbon(this.view()),
  );

  protected readonly placedKeys = computed(() => {
    const place = this.tall() ? tallKeyPoint : wideKeyPoint;
    return this.keys().map((key) => ({ ...key, at: place(this.view(), key.atMs) }));
  });

  protected readonly tableColumns: readonly FigureColumn[] = [
    { head: 'Run', numeric: false },
    { head: 'Sub from', numeric: true },
    { head: 'Aspect', numeric: true },
    { head: 'Keep limit', numeric: false },
  ];
  protected readonly tableRows = computed(() =>
    this.runs().flatMap((run) =>
      subCells(run).map((cell) => [
        run.name,
        clockText(cell.fromMs, this.timeZone()),
        ratioText(cell.aspect),
        cell.over ? 'over' : 'within',
      ]),
    ),
  );

  protected select(event: MouseEvent): void {
    const box = (event.currentTarget as HTMLElement).getBoundingClientRect();
    const alongPx = this.tall() ? event.clientY - box.top : event.clientX - box.left;
    const scale = this.tall() ? tallTimeScale(this.view()) : timeScale(this.view());
    const run = this.runs().find(
      (each) => scale(each.startMs) <= alongPx && alongPx <= scale(endMs(each)),
    );
    if (run) this.runSelected.emit(run.id);
  }
}

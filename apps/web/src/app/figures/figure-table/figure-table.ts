import { ChangeDetectionStrategy, Component, input, signal } from '@angular/core';

export interface FigureColumn {
  readonly head: string;
  readonly numeric: boolean;
}

/** The values of a figure once more, as a table one click away. */
@Component({
  selector: 'app-figure-table',
  templateUrl: './figure-table.html',
  styleUrl: './figure-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FigureTable {
  readonly of = input.required<string>();
  readonly columns = input.required<readonly FigureColumn[]>();
  readonly rows = input.required<readonly (readonly string[])[]>();

  /** Rows are put into the page only when they are asked for: a trace has hundreds. */
  protected readonly open = signal(false);

  protected follow(event: Event): void {
    if (event.target instanceof HTMLDetailsElement) this.open.set(event.target.open);
  }
}

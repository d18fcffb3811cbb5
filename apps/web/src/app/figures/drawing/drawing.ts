import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import type { Shape } from './shapes';

let drawings = 0;

/** An SVG figure from its shapes. */
@Component({
  selector: 'app-drawing',
  templateUrl: './drawing.html',
  styleUrl: './drawing.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Drawing {
  /** Says the result, not the form. */
  readonly label = input.required<string>();
  readonly widthPx = input.required<number>();
  readonly heightPx = input.required<number>();
  readonly shapes = input.required<readonly Shape[]>();

  /** Names of patterns hold for the whole page: each drawing has its own. */
  protected readonly id = `drawing-${++drawings}`;
  protected readonly axes = ['ra', 'dec'] as const;
}

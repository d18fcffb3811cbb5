import { PercentPipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

const WIDTHS_PERCENT = [58, 74, 41, 66, 52];

/**
 * What stands in the place of something that loads: nothing for 300 ms, then flat bars, and with a `share` (0 to 1) a
 * bar of progress with its number. It keeps the height of `lines` lines of text from the start, so that nothing jumps.
 */
@Component({
  selector: 'app-waiting',
  imports: [PercentPipe],
  templateUrl: './waiting.html',
  styleUrl: './waiting.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Waiting {
  /** "Loading the nights": read out, not shown. */
  readonly label = input.required<string>();
  readonly lines = input(3);
  readonly share = input<number>();

  protected readonly widths = computed(() =>
    Array.from({ length: this.lines() }, (_, line) => WIDTHS_PERCENT[line % WIDTHS_PERCENT.length]),
  );
}

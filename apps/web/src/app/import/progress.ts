import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { percentText } from '../figures/measure-text';

/** A bar of progress with its number beside it. */
@Component({
  selector: 'app-progress',
  template: `
    <div
      class="bar"
      role="progressbar"
      aria-valuemin="0"
      aria-valuemax="100"
      [attr.aria-label]="label()"
      [attr.aria-valuenow]="percent()"
    >
      <i [style.inline-size.%]="percent()"></i>
    </div>
    <span class="n">{{ text() }}</span>
  `,
  styles: `
    :host {
      display: grid;
      grid-template-columns: minmax(60px, 150px) auto;
      gap: 10px;
      align-items: center;
      justify-content: start;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Progress {
  readonly label = input.required<string>();
  /** 0 to 1. */
  readonly share = input.required<number>();

  protected readonly percent = computed(() => Math.round(this.share() * 100));
  protected readonly text = computed(() => percentText(this.share()));
}

import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { NO_VALUE } from '../figures/measure-text';
import { type Reading } from './optics-readings';

/** Figures that follow from the fields beside them, each with one sentence on what it means. */
@Component({
  selector: 'app-optics-notes',
  template: `
    @for (reading of readings(); track reading.name) {
      <div class="note">
        <h3>
          {{ reading.name }} <span class="figure">{{ reading.figure ?? none }}</span>
        </h3>
        <p>{{ reading.meaning }}</p>
      </div>
    }
  `,
  styles: `
    h3 {
      display: flex;
      gap: 12px;
      justify-content: space-between;
      align-items: baseline;
    }
    .figure {
      font: 500 14px/20px var(--mono);
      white-space: nowrap;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    class: 'margin',
    role: 'complementary',
    '[attr.aria-label]': '"What follows, " + about()',
  },
})
export class OpticsNotes {
  /** Imaging, guiding or sky: tells the margins of the page apart. */
  readonly about = input.required<string>();
  readonly readings = input.required<readonly Reading[]>();
  protected readonly none = NO_VALUE;
}

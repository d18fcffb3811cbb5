import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';
import type { ShownRun } from './shown-run';

/** Choose a run of the night. */
@Component({
  selector: 'app-run-chips',
  template: `
    <div class="chips" role="group" aria-label="Run that the figures show">
      @for (run of runs(); track run.id) {
        <button
          class="chip"
          type="button"
          [attr.aria-pressed]="run.id === chosenId()"
          (click)="choose.emit(run.id)"
        >
          {{ run.name }}
        </button>
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunChips {
  readonly runs = input.required<readonly ShownRun[]>();
  readonly chosenId = input.required<string>();
  readonly choose = output<string>();
}

import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

export interface SubLengthOption {
  readonly seconds: number;
  readonly text: string;
  /** Share kept under it. */
  readonly share: string;
}

/** Choose the length of one sub; under each length the share of subs that would be kept. */
@Component({
  selector: 'app-sub-length-choice',
  template: `
    <span>Sub length, subs kept</span>
    <div class="choice" role="group" aria-label="Sub length">
      @for (option of options(); track option.seconds) {
        <button
          type="button"
          [attr.aria-pressed]="option.seconds === chosenSeconds()"
          (click)="choose.emit(option.seconds)"
        >
          {{ option.text }}<small>{{ option.share }}</small>
        </button>
      }
    </div>
  `,
  styleUrl: './sub-length-choice.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SubLengthChoice {
  readonly options = input.required<readonly SubLengthOption[]>();
  /** null: the runs differ, and each goes by its own. */
  readonly chosenSeconds = input.required<number | null>();
  readonly choose = output<number>();
}

import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { sentenceOf } from '../api/problem-error';

/** What failed (`what`, a sentence), why (the error in words), and a way on; further ways are projected. */
@Component({
  selector: 'app-failure',
  imports: [MatButton],
  template: `
    <div role="alert">
      <p>
        <b>{{ what() }}</b> {{ why() }}
      </p>
    </div>
    <p class="actions">
      <button matButton="outlined" type="button" (click)="retry.emit()">Try again</button>
      <ng-content />
    </p>
  `,
  styleUrl: './failure.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Failure {
  readonly what = input.required<string>();
  readonly error = input.required<unknown>();

  readonly retry = output();

  protected readonly why = computed(() => sentenceOf(this.error()));
}

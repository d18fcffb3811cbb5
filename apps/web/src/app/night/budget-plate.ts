import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { BudgetRuler, type BudgetKey } from '../figures/budget-ruler/budget-ruler';
import { keyedOn, type FindingNote } from './page-notes';
import { runTitle, type ShownRun } from './shown-run';

/** What the error of the chosen run is made of. */
@Component({
  selector: 'app-budget-plate',
  imports: [BudgetRuler],
  template: `
    <div class="plate-head">
      <h2>What the error is made of</h2>
      <div class="aside">{{ title() }}</div>
    </div>
    @if (budget(); as parts) {
      <figure>
        <app-budget-ruler [ra]="parts.ra" [dec]="parts.dec" [keys]="keys()" />
        <figcaption>
          Each ruler is 100 % of that axis's mean square error about the lock position. Sizes add as
          squares, so curing a part leaves more than a subtraction suggests; “leaves” is the RMS
          that would remain without it.
        </figcaption>
      </figure>
    } @else {
      <p>{{ why() }}</p>
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class BudgetPlate {
  readonly run = input.required<ShownRun>();
  readonly notes = input.required<readonly FindingNote[]>();

  protected readonly title = computed(() => runTitle(this.run()));
  protected readonly budget = computed(() => {
    const { budget, ra, dec } = this.run().of.run;
    if (!budget || !ra || !dec) return null;
    return {
      ra: { rmsAboutLockArcsec: ra.rmsAboutLockArcsec, parts: budget.ra },
      dec: { rmsAboutLockArcsec: dec.rmsAboutLockArcsec, parts: budget.dec },
    };
  });
  protected readonly keys = computed(() =>
    keyedOn('budget', this.notes()).map(({ key, axis, finding }): BudgetKey => {
      // A loop that answers too little leaves the mount's motion: its part is what cannot be explained otherwise.
      const part = finding.code === 'over-correction' ? 'over-correction' : 'unexplained';
      return { ...key, axis, part };
    }),
  );
  protected readonly why = computed(
    () => this.run().of.run.whyMissing['budget'] ?? 'The parts cannot be told from this run.',
  );
}

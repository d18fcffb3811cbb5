import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { mountMeasures } from './mount-measures';
import { runTitle, type ShownRun } from './shown-run';

/** The measures of the mount that the chosen run gives, or why it cannot give them. */
@Component({
  selector: 'app-mount-plate',
  template: `
    <div class="plate-head">
      <h2>What else the mount did</h2>
      <div class="aside">{{ title() }}</div>
    </div>
    <table class="table">
      <thead>
        <tr>
          <th scope="col">Measure</th>
          <th scope="col" class="r">RA</th>
          <th scope="col" class="r">Dec</th>
        </tr>
      </thead>
      <tbody>
        @for (measure of measures(); track measure.name) {
          <tr class="values">
            <th scope="row">{{ measure.name }}</th>
            <td class="r">{{ measure.ra }}</td>
            <td class="r">{{ measure.dec }}</td>
          </tr>
          <tr class="why">
            <td colspan="3">{{ measure.note }}</td>
          </tr>
        }
      </tbody>
    </table>
  `,
  styles: `
    :host {
      display: block;
    }
    .table .values > * {
      padding-bottom: 0;
      border-bottom: 0;
    }
    .table .why > td {
      padding-top: 0;
      font-size: 13px;
      line-height: 17px;
      color: var(--ink-2);
    }
    @media (max-width: 700px) {
      .table td.r {
        white-space: normal;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MountPlate {
  readonly run = input.required<ShownRun>();

  protected readonly title = computed(() => runTitle(this.run()));
  protected readonly measures = computed(() => mountMeasures(this.run().of.run));
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { FigureKey } from '../figures/figure-key/figure-key';
import { mountMeasures } from './mount-measures';
import { keyedOn, type FindingNote } from './page-notes';
import { runTitle, type ShownRun } from './shown-run';

/** The measures of the mount that the chosen run gives, or why it cannot give them. */
@Component({
  selector: 'app-mount-plate',
  imports: [FigureKey],
  template: `
    <div class="plate-head">
      <h2>What else the mount did</h2>
      <div class="aside">{{ title() }}</div>
    </div>
    <table class="table">
      <thead>
        <tr>
          <th scope="col">Measure</th>
          <th scope="col" class="r wide">RA</th>
          <th scope="col" class="r wide">Dec</th>
        </tr>
      </thead>
      <tbody>
        @for (measure of measures(); track measure.name) {
          <tr class="values">
            <th scope="row">
              {{ measure.name }}
              @for (key of measure.keys; track key.letter) {
                <app-figure-key [key]="key" [at]="null" />
              }
              <span class="narrow">
                <span>RA {{ measure.ra }}</span>
                <span>Dec {{ measure.dec }}</span>
              </span>
            </th>
            <td class="r wide">{{ measure.ra }}</td>
            <td class="r wide">{{ measure.dec }}</td>
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
    .narrow {
      display: none;
    }
    @media (max-width: 700px) {
      .wide {
        display: none;
      }
      .narrow {
        display: flex;
        flex-wrap: wrap;
        gap: 0 20px;
        font: 400 13.5px/20px var(--mono);
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MountPlate {
  readonly run = input.required<ShownRun>();
  readonly notes = input.required<readonly FindingNote[]>();

  protected readonly title = computed(() => runTitle(this.run()));
  protected readonly measures = computed(() => {
    const notes = keyedOn('mount', this.notes());
    return mountMeasures(this.run().of.run).map((measure) => ({
      ...measure,
      keys: notes
        .filter(({ finding }) => measure.findings.includes(finding.code))
        .map(({ key }) => key),
    }));
  });
}

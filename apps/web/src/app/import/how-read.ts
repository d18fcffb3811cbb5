import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { secondsText } from '../figures/measure-text';
import { cadenceSeconds } from './cadence';
import { UNIT_WORDS } from './column-words';
import type { Intake } from './intake';

/** How a file is written, as it was found out. */
@Component({
  selector: 'app-how-read',
  template: `
    <h3>How the file is read</h3>
    <dl class="gain">
      @for (fact of facts(); track fact.name) {
        <dt>{{ fact.name }}</dt>
        <dd>{{ fact.value }}</dd>
      }
    </dl>
  `,
  styles: `
    h3 {
      font: 620 15.5px/22px var(--text);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class HowRead {
  readonly intake = input.required<Intake>();
  /** Of the rig's site. */
  readonly timeZone = input.required<string>();

  protected readonly facts = computed(() => {
    const { preview, choices, needsStart } = this.intake();
    if (!preview) return [];
    const time = choices.find(({ role }) => role === 'time')?.unit;
    const cadence = cadenceSeconds(preview, choices);
    return [
      ...(time
        ? [{ name: 'Time', value: UNIT_WORDS[time] + (needsStart ? ', no date' : '') }]
        : []),
      ...(time === 'iso' || time === 'clock'
        ? [{ name: 'Zone, if none is told', value: this.timeZone() }]
        : []),
      ...(cadence === null ? [] : [{ name: 'Cadence', value: secondsText(cadence) }]),
      { name: 'Encoding', value: preview.encoding },
    ];
  });
}

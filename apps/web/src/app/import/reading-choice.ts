import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { type ChosenColumn, ColumnPicker } from './column-picker';
import { HowRead } from './how-read';
import { type HandChoice, type Intake, type KnownMap, NOTHING_BY_HAND } from './intake';
import { MapSaver } from './map-saver';
import { MapSettingsFields } from './map-settings';
import { StartField } from './start-field';

/** What the reader understood of a file, all of it open to be changed. */
@Component({
  selector: 'app-reading-choice',
  imports: [ColumnPicker, HowRead, MapSaver, MapSettingsFields, StartField],
  templateUrl: './reading-choice.html',
  styleUrl: './reading-choice.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingChoice {
  readonly rigId = input.required<string>();
  readonly rigName = input.required<string>();
  readonly timeZone = input.required<string>();
  readonly fileName = input.required<string>();
  readonly intake = input.required<Intake>();
  readonly hand = input.required<HandChoice>();
  readonly maps = input.required<readonly KnownMap[]>();
  readonly startLocal = input.required<string>();
  readonly startHint = input.required<string>();
  readonly handChanged = output<HandChoice>();
  readonly startChanged = output<string>();
  readonly mapSaved = output();

  /** What was changed by hand can be kept under a name. */
  protected readonly toSave = computed(() => {
    const intake = this.intake();
    return intake.map && !intake.savedMap && intake.missing === null ? intake : null;
  });

  protected choose({ column, choice }: ChosenColumn): void {
    const columns = this.intake().choices.map((before, i) => (i === column ? choice : before));
    this.handChanged.emit({ ...this.hand(), columns });
  }

  protected take(event: Event): void {
    if (!(event.target instanceof HTMLSelectElement)) return;
    const { value } = event.target;
    const taken = this.maps().find(({ id }) => id === value) ?? null;
    this.handChanged.emit({ ...NOTHING_BY_HAND, taken });
  }
}

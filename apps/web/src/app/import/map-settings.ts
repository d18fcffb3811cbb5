import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { columnMapSchema } from '@stillpier/contract';
import type { ColumnRole } from '@stillpier/guide-log';
import { DELIMITER_CHOICES } from './column-words';
import type { HandChoice, Intake, MapSettings } from './intake';

type Setting = 'decimal' | 'correctionSign' | 'dateOrder';

const CORRECTION_ROLES: readonly ColumnRole[] = ['raCorrection', 'decCorrection'];
const CAMERA_ROLES: readonly ColumnRole[] = ['xError', 'yError'];

/** How a file is read beside its columns: as it was found out, open to be changed. */
@Component({
  selector: 'app-map-settings',
  templateUrl: './map-settings.html',
  styleUrl: './map-settings.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MapSettingsFields {
  readonly intake = input.required<Intake>();
  readonly hand = input.required<HandChoice>();
  readonly changed = output<HandChoice>();

  protected readonly delimiters = DELIMITER_CHOICES;
  protected readonly shown = computed(() => {
    const { preview, choices, map } = this.intake();
    const has = (roles: readonly ColumnRole[]): boolean =>
      choices.some(({ role }) => role !== null && roles.includes(role));
    return {
      delimiter: preview?.delimiter,
      decimal: preview?.decimal,
      headerLine: preview?.headerLine ?? 0,
      dateOrder: preview?.dateOrder ?? null,
      asksDateOrder: preview?.asksDateOrder === true || preview?.dateOrder !== null,
      asksSign: has(CORRECTION_ROLES),
      sign: map?.correctionSign ?? '',
      asksAngle: has(CAMERA_ROLES),
      angleDegrees: map?.cameraAngleDegrees ?? null,
      mirrored: map?.cameraMirrored === true,
    };
  });

  /** Another delimiter or header line makes other columns: what was chosen for the earlier ones goes. */
  protected pickDelimiter(event: Event): void {
    const read = columnMapSchema.shape.delimiter.safeParse(textOf(event));
    if (read.success) this.emit({ delimiter: read.data }, null);
  }

  protected setHeaderLine(event: Event): void {
    const read = columnMapSchema.shape.headerLine.safeParse(numberOf(event));
    if (read.success) this.emit({ headerLine: read.data }, null);
  }

  protected pick(setting: Setting, event: Event): void {
    const text = textOf(event);
    const read = columnMapSchema.shape[setting].safeParse(text === '' ? undefined : text);
    if (read.success) this.emit({ [setting]: read.data }, this.hand().columns);
  }

  protected setAngle(event: Event): void {
    const read = columnMapSchema.shape.cameraAngleDegrees.safeParse(numberOf(event));
    if (read.success) this.emit({ cameraAngleDegrees: read.data }, this.hand().columns);
  }

  protected setMirrored(event: Event): void {
    if (!(event.target instanceof HTMLInputElement)) return;
    this.emit({ cameraMirrored: event.target.checked }, this.hand().columns);
  }

  private emit(part: MapSettings, columns: HandChoice['columns']): void {
    const { taken, settings } = this.hand();
    this.changed.emit({ taken, settings: { ...settings, ...part }, columns });
  }
}

function textOf(event: Event): string {
  return event.target instanceof HTMLSelectElement || event.target instanceof HTMLInputElement
    ? event.target.value
    : '';
}

/** undefined for an empty field: what is not said is found out. */
function numberOf(event: Event): number | undefined {
  const text = textOf(event).trim().replace(',', '.');
  return text === '' ? undefined : Number(text);
}

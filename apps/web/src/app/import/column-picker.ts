import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import {
  COLUMN_ROLES,
  type ColumnRole,
  UNIT_MAY_BE_LEFT_OUT,
  UNITS_OF_ROLE,
} from '@stillpier/guide-log';
import { ROLE_WORDS, UNIT_WORDS } from './column-words';
import { type ColumnChoice, type Intake, withRole } from './intake';

const ROWS = 9;

export interface ChosenColumn {
  readonly column: number;
  readonly choice: ColumnChoice;
}

/** The first lines of a file; over each column what it is taken for, and in which unit. */
@Component({
  selector: 'app-column-picker',
  templateUrl: './column-picker.html',
  styleUrl: './column-picker.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ColumnPicker {
  readonly intake = input.required<Intake>();
  readonly chosen = output<ChosenColumn>();

  protected readonly roles = COLUMN_ROLES.map((role) => ({ role, words: ROLE_WORDS[role] }));
  protected readonly columns = computed(() =>
    (this.intake().preview?.columns ?? []).map((column, i) => {
      const choice = this.intake().choices[i] ?? { role: null, unit: null };
      const units = choice.role === null ? [] : UNITS_OF_ROLE[choice.role];
      const header = column.header ?? `column ${column.number}`;
      return {
        ...choice,
        header,
        name: header === '' ? `column ${column.number}` : header,
        units: units.map((unit) => ({ unit, words: UNIT_WORDS[unit] })),
        asksUnit: choice.role !== null && units.length > 0 && !mayDropUnit(choice.role),
        ignored: choice.role === 'ignore',
      };
    }),
  );
  protected readonly rows = computed(() => this.intake().preview?.rows.slice(0, ROWS) ?? []);

  protected pickRole(column: number, event: Event): void {
    const role = COLUMN_ROLES.find((each) => each === valueOf(event));
    this.chosen.emit({ column, choice: role ? withRole(role) : { role: null, unit: null } });
  }

  protected pickUnit(column: number, role: ColumnRole | null, event: Event): void {
    const unit = role && UNITS_OF_ROLE[role].find((each) => each === valueOf(event));
    this.chosen.emit({ column, choice: { role, unit: unit ?? null } });
  }
}

function mayDropUnit(role: ColumnRole): boolean {
  return UNIT_MAY_BE_LEFT_OUT.includes(role) && UNITS_OF_ROLE[role].length === 1;
}

function valueOf(event: Event): string {
  return event.target instanceof HTMLSelectElement ? event.target.value : '';
}

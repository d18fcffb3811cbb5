import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { type FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatAutocomplete, MatAutocompleteTrigger, MatOption } from '@angular/material/autocomplete';
import { switchMap } from 'rxjs';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';

const SHOWN_AT_MOST = 30;

/** A time zone by its IANA name, with the names that hold what was typed. */
@Component({
  selector: 'app-time-zone-field',
  imports: [
    Field,
    FieldInput,
    MatAutocomplete,
    MatAutocompleteTrigger,
    MatOption,
    ReactiveFormsModule,
  ],
  template: `
    <app-field
      label="Time zone"
      hint="A night lasts from noon to noon here. Type part of the name."
      [control]="control()"
    >
      <input
        appFieldInput
        type="text"
        autocomplete="off"
        [formControl]="control()"
        [matAutocomplete]="zones"
      />
    </app-field>
    <mat-autocomplete #zones="matAutocomplete">
      @for (zone of matching(); track zone) {
        <mat-option [value]="zone">{{ zone }}</mat-option>
      }
    </mat-autocomplete>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TimeZoneField {
  readonly control = input.required<FormControl<string>>();

  private readonly zones = Intl.supportedValuesOf('timeZone');
  private readonly typed = toSignal(
    toObservable(this.control).pipe(switchMap((control) => control.valueChanges)),
    { initialValue: '' },
  );
  protected readonly matching = computed(() => {
    const part = this.typed().trim().toLowerCase().replaceAll(' ', '_');
    return this.zones.filter((zone) => zone.toLowerCase().includes(part)).slice(0, SHOWN_AT_MOST);
  });
}

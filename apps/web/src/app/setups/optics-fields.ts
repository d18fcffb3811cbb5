import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type FormControl, ReactiveFormsModule } from '@angular/forms';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';

interface OpticsControls {
  readonly focalLengthMm: FormControl<number | null>;
  readonly apertureMm: FormControl<number | null>;
  readonly pixelUm: FormControl<number | null>;
  readonly binning: FormControl<number | null>;
}

/** Telescope and camera, imaging or guiding: the four numbers that both have. */
@Component({
  selector: 'app-optics-fields',
  imports: [Field, FieldInput, ReactiveFormsModule],
  template: `
    <app-field label="Focal length, mm" [hint]="focalHint()" [control]="controls().focalLengthMm">
      <input appFieldInput type="number" step="any" [formControl]="controls().focalLengthMm" />
    </app-field>
    <app-field label="Aperture, mm" [control]="controls().apertureMm">
      <input appFieldInput type="number" step="any" [formControl]="controls().apertureMm" />
    </app-field>
    <app-field label="Pixel size, µm" [control]="controls().pixelUm">
      <input appFieldInput type="number" step="any" [formControl]="controls().pixelUm" />
    </app-field>
    <app-field label="Binning" [control]="controls().binning">
      <input
        appFieldInput
        type="number"
        min="1"
        max="8"
        step="1"
        [formControl]="controls().binning"
      />
    </app-field>
    <ng-content />
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'fields' },
})
export class OpticsFields {
  readonly controls = input.required<OpticsControls>();
  readonly focalHint = input.required<string>();
}

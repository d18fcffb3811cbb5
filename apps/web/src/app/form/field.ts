import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { toObservable, toSignal } from '@angular/core/rxjs-interop';
import { type AbstractControl } from '@angular/forms';
import { switchMap } from 'rxjs';

let fieldCount = 0;

/**
 * One field of a form: label above, the control (projected, marked `appFieldInput`), hint and fault below.
 *
 *     <app-field label="Aperture, mm" [control]="form.controls.apertureMm">
 *       <input appFieldInput type="number" formControlName="apertureMm" />
 *     </app-field>
 */
@Component({
  selector: 'app-field',
  templateUrl: './field.html',
  styleUrl: './field.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Field {
  readonly label = input.required<string>();
  readonly control = input.required<AbstractControl>();
  readonly hint = input<string>();

  readonly id = `field-${++fieldCount}`;
  private readonly change = toSignal(
    toObservable(this.control).pipe(switchMap((control) => control.events)),
  );
  /** The sentence under the field, when the last submission refused it; see `FormSubmission`. */
  readonly fault = computed(() => {
    this.change(); // errors are no signal: each event of the control may have changed them
    const fault: unknown = this.control().errors?.['fault'];
    return typeof fault === 'string' ? fault : null;
  });
  readonly describedBy = computed(() =>
    this.fault() !== null
      ? `${this.id}-fault`
      : this.hint() === undefined
        ? null
        : `${this.id}-hint`,
  );
}

import { Directive, inject } from '@angular/core';
import { Field } from './field';

/** Ties an input or select to the `app-field` around it: its label, its hint, its fault. */
@Directive({
  selector: '[appFieldInput]',
  host: {
    class: 'field-input',
    '[id]': 'field.id',
    '[attr.aria-describedby]': 'field.describedBy()',
    '[attr.aria-invalid]': 'field.fault() === null ? null : true',
  },
})
export class FieldInput {
  protected readonly field = inject(Field);
}

import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  ElementRef,
  inject,
  input,
} from '@angular/core';
import { type FormSubmission } from './form-submission';

/** Stands in a form, above its button: says why the last try failed and puts the focus on the first refused field. */
@Component({
  selector: 'app-form-message',
  template: `
    <div role="alert">
      @if (submission().message(); as text) {
        <p class="refusal">{{ text }}</p>
      }
    </div>
    <ng-content />
  `,
  styles: ':host { display: block; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FormMessage {
  private readonly element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  readonly submission = input.required<FormSubmission>();

  constructor() {
    afterRenderEffect(() => {
      if (this.submission().message() === null) return;
      this.element.closest('form')?.querySelector<HTMLElement>('[aria-invalid]')?.focus();
    });
  }
}

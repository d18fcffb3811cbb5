import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A sentence in parts, its numbers strong: `<h1 class="sentence"><app-emphasis [parts]="night.sentence" /></h1>`. */
@Component({
  selector: 'app-emphasis',
  template: `
    @for (part of parts(); track $index) {
      @if (part.strong) {
        <b [textContent]="part.text"></b>
      } @else {
        <span [textContent]="part.text"></span>
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Emphasis {
  readonly parts = input.required<readonly { readonly text: string; readonly strong: boolean }[]>();
}

import { ChangeDetectionStrategy, Component, input } from '@angular/core';

/** A sentence in parts, its numbers strong: `<h1 class="sentence"><app-emphasis [parts]="night.sentence" /></h1>`. */
@Component({
  selector: 'app-emphasis',
  template: `@for (part of parts(); track $index) {
    <span [class.strong]="part.strong" [textContent]="part.text"></span>
  }`,
  styles: '.strong { font-weight: 680; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Emphasis {
  readonly parts = input.required<readonly { readonly text: string; readonly strong: boolean }[]>();
}

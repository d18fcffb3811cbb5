import { Location } from '@angular/common';
import { computed, Directive, DOCUMENT, inject, input } from '@angular/core';

/** A link to an element of the same page, by its id: it takes the focus, which brings it into sight. */
@Directive({
  selector: 'a[appLeadsTo]',
  host: { '[attr.href]': 'href()', '(click)': 'follow($event)' },
})
export class LeadsTo {
  private readonly location = inject(Location);
  private readonly document = inject(DOCUMENT);

  readonly appLeadsTo = input.required<string>();

  /** With the path: a bare fragment would be taken from the base of the application. */
  protected readonly href = computed(() => `${this.location.path()}#${this.appLeadsTo()}`);

  protected follow(event: Event): void {
    const target = this.document.getElementById(this.appLeadsTo());
    if (!target) return;
    event.preventDefault();
    target.focus();
  }
}

import { ChangeDetectionStrategy, Component, input, output } from '@angular/core';

/** Asks for the time of the first frame of a log whose times tell no date. */
@Component({
  selector: 'app-start-field',
  template: `
    <h3>When did it start?</h3>
    <p>The times in this file tell no date. Give the time of its first frame at the site.</p>
    <label>
      First frame, {{ timeZone() }}
      <input
        class="field-input"
        type="datetime-local"
        step="1"
        [value]="local()"
        (input)="take($event)"
      />
    </label>
    <p class="hint">{{ hint() }}</p>
  `,
  styles: `
    h3 {
      font: 620 15.5px/22px var(--text);
    }
    label {
      display: block;
      margin-top: 8px;
      font-size: 14px;
      line-height: 20px;
      color: var(--ink-2);
    }
    // Its sign is white in every theme; the field can be typed into.
    :host-context(.theme-red) input::-webkit-calendar-picker-indicator {
      display: none;
    }
    .hint {
      margin-top: 4px;
      font-size: 14px;
      line-height: 20px;
      color: var(--ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StartField {
  readonly local = input.required<string>();
  readonly hint = input.required<string>();
  readonly timeZone = input.required<string>();
  readonly changed = output<string>();

  protected take(event: Event): void {
    if (event.target instanceof HTMLInputElement) this.changed.emit(event.target.value);
  }
}

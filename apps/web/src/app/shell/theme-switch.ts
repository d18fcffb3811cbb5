import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { THEME_NAMES, ThemeChoice } from './theme-choice';

/** Day, night, red light, as three buttons in the running head. */
@Component({
  selector: 'app-theme-switch',
  template: `
    <div class="choice" role="group" aria-label="Theme">
      @for (theme of themes; track theme.id) {
        <button
          type="button"
          [attr.aria-pressed]="choice.theme() === theme.id"
          (click)="choice.choose(theme.id)"
        >
          {{ theme.name }}
        </button>
      }
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ThemeSwitch {
  protected readonly choice = inject(ThemeChoice);
  protected readonly themes = THEME_NAMES;
}

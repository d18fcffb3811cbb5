import { computed, DestroyRef, DOCUMENT, inject, Injectable, signal } from '@angular/core';

export const THEME_NAMES = [
  { id: 'day', name: 'Day' },
  { id: 'night', name: 'Night' },
  { id: 'red', name: 'Red light' },
] as const;
export type Theme = (typeof THEME_NAMES)[number]['id'];

/** Read by theme-boot.js as well. */
const STORAGE_KEY = 'stillpier-theme';

/** Day, night or red light: follows the system until one is chosen, then keeps the choice on this device. */
@Injectable({ providedIn: 'root' })
export class ThemeChoice {
  private readonly document = inject(DOCUMENT);
  private readonly window = this.document.defaultView;
  private readonly systemDark = this.window?.matchMedia('(prefers-color-scheme: dark)');
  private readonly chosen = signal(this.stored());
  private readonly system = signal<Theme>(this.systemDark?.matches === true ? 'night' : 'day');

  readonly theme = computed(() => this.chosen() ?? this.system());

  constructor() {
    const follow = (event: MediaQueryListEvent): void => {
      this.system.set(event.matches ? 'night' : 'day');
      this.show();
    };
    this.systemDark?.addEventListener('change', follow);
    inject(DestroyRef).onDestroy(() => this.systemDark?.removeEventListener('change', follow));
    this.show();
  }

  choose(theme: Theme): void {
    this.chosen.set(theme);
    try {
      this.window?.localStorage.setItem(STORAGE_KEY, theme);
    } catch {
      // Storage is off: the choice lasts until the page is left.
    }
    this.show();
  }

  private show(): void {
    this.document.documentElement.className = `theme-${this.theme()}`;
  }

  private stored(): Theme | null {
    try {
      const name = this.window?.localStorage.getItem(STORAGE_KEY);
      return THEME_NAMES.find(({ id }) => id === name)?.id ?? null;
    } catch {
      return null; // storage is off
    }
  }
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';

const WORDS = { fine: 'Fine', watch: 'Watch', act: 'Act' } as const;

/** The severity mark with its word: open is fine, half filled is watch, filled is act. Ink only, never a colour. */
@Component({
  selector: 'app-severity',
  template: `
    <svg width="13" height="13" viewBox="0 0 13 13" aria-hidden="true">
      <circle class="rim" cx="6.5" cy="6.5" r="5.5" [class.filled]="level() === 'act'" />
      @if (level() === 'watch') {
        <path class="half" d="M6.5 1A5.5 5.5 0 0 1 6.5 12Z" />
      }
    </svg>
    <span>{{ text() }}</span>
  `,
  styleUrl: './severity.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Severity {
  readonly level = input.required<keyof typeof WORDS>();
  /** What it is about: "Act: periodic error". */
  readonly about = input<string>();

  /** In place of its word, where the words around the mark say it: "3 to act on". */
  readonly words = input<string>();

  protected readonly text = computed(() => {
    const words = this.words();
    if (words !== undefined) return words;
    const about = this.about();
    return about === undefined ? WORDS[this.level()] : `${WORDS[this.level()]}: ${about}`;
  });
}

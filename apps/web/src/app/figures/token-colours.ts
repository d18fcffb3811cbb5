import { DestroyRef, DOCUMENT, inject, Injectable, signal, type Signal } from '@angular/core';

const CANVAS_TOKENS = {
  paper: '--paper',
  ink: '--ink',
  ink2: '--ink-2',
  rule: '--rule',
  ruleStrong: '--rule-strong',
  mark: '--mark',
  ra: '--ra',
  raTint: '--ra-tint',
  dec: '--dec',
  decTint: '--dec-tint',
  hatch: '--hatch',
} as const;

export type CanvasColours = Record<keyof typeof CANVAS_TOKENS, string> & {
  /** Dash of a Dec line, in pixels; empty for a solid one. */
  readonly decDash: readonly number[];
};

/** The tokens as a canvas needs them: resolved colours, read again whenever the theme class changes. */
@Injectable({ providedIn: 'root' })
export class TokenColours {
  private readonly document = inject(DOCUMENT);
  private readonly state = signal(this.read());

  readonly colours: Signal<CanvasColours> = this.state.asReadonly();

  constructor() {
    const observer = new MutationObserver(() => {
      this.state.set(this.read());
    });
    observer.observe(this.document.documentElement, { attributeFilter: ['class'] });
    inject(DestroyRef).onDestroy(() => {
      observer.disconnect();
    });
  }

  private read(): CanvasColours {
    // A custom property hands back its text, such as light-dark(…); `color` of a probe resolves it.
    const probe = this.document.createElement('span');
    probe.hidden = true;
    this.document.body.append(probe);
    const colour = (token: string): string => {
      probe.style.color = `var(${token})`;
      return getComputedStyle(probe).color;
    };
    const colours = Object.fromEntries(
      Object.entries(CANVAS_TOKENS).map(([name, token]) => [name, colour(token)]),
    ) as Record<keyof typeof CANVAS_TOKENS, string>;
    const decDash = getComputedStyle(probe)
      .getPropertyValue('--dec-dash')
      .split(/\s+/)
      .map(Number)
      .filter((length) => length > 0);
    probe.remove();
    return { ...colours, decDash };
  }
}

import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  ElementRef,
  inject,
  input,
  signal,
  viewChildren,
} from '@angular/core';
import type { Finding } from '@stillpier/contract';
import { KeyPlaces } from '../figures/figure-key/key-places';
import { LeadsTo } from '../figures/figure-key/leads-to';
import { arcsecText, ratioText } from '../figures/measure-text';
import { Severity } from '../page/severity';
import type { Figure } from './finding-names';
import { besideKeys } from './note-places';
import type { FindingNote } from './page-notes';

/** From this width on the margin stands beside the figures; below it folds under them. */
const WITH_MARGIN = '(min-width: 1280px)';

/** The findings that speak about one figure, in the margin beside it, each at the height of its key. */
@Component({
  selector: 'app-notes-of',
  imports: [LeadsTo, Severity],
  templateUrl: './notes-of.html',
  styleUrl: './notes-of.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'complementary', '[attr.aria-label]': 'label()' },
})
export class NotesOf {
  private readonly keyPlaces = inject(KeyPlaces);
  private readonly host = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;

  readonly figure = input.required<Figure>();
  /** All of the page; those that speak about another figure are left out. */
  readonly notes = input.required<readonly FindingNote[]>();

  private readonly elements = viewChildren<ElementRef<HTMLElement>>('note');
  protected readonly label = computed(() => `Findings beside the figure of the ${this.figure()}`);
  protected readonly shown = computed(() =>
    this.notes()
      .filter(({ figure }) => figure === this.figure())
      .map((note) => ({ ...note, gains: gainsOf(note.finding) })),
  );

  /** What moves a key without redrawing it: the width of the page, fonts, a table that opens. */
  private readonly relaid = signal(0);
  /** Room above each note, in pixels. */
  protected readonly roomsPx = signal<readonly number[]>([]);

  constructor() {
    const observer = new ResizeObserver(() => {
      this.relaid.update((count) => count + 1);
    });
    observer.observe(this.host.parentElement ?? this.host);
    inject(DestroyRef).onDestroy(() => {
      observer.disconnect();
    });
    afterRenderEffect(() => {
      this.relaid();
      this.keyPlaces.moved();
      this.roomsPx.set(this.rooms());
    });
  }

  private rooms(): number[] {
    const elements = this.elements();
    if (!matchMedia(WITH_MARGIN).matches) return [];
    const topPx =
      this.host.getBoundingClientRect().top + parseFloat(getComputedStyle(this.host).paddingTop);
    return besideKeys(
      this.shown().map(({ key }, i) => {
        const middlePx = key ? this.keyPlaces.middlePx(key.letter) : null;
        return {
          keyPx: middlePx === null ? null : middlePx - topPx,
          heightPx: elements[i]?.nativeElement.offsetHeight ?? 0,
        };
      }),
    );
  }
}

function gainsOf({ gain }: Finding): { label: string; value: string }[] {
  if (!gain) return [];
  return [
    ...(gain.rmsIfCuredArcsec === null
      ? []
      : [{ label: 'RMS without it', value: arcsecText(gain.rmsIfCuredArcsec) }]),
    ...(gain.aspectIfCured === null
      ? []
      : [{ label: 'aspect without it', value: ratioText(gain.aspectIfCured) }]),
    ...(gain.subsKeptIfCured === null
      ? []
      : [{ label: 'subs kept without it', value: String(gain.subsKeptIfCured) }]),
  ];
}

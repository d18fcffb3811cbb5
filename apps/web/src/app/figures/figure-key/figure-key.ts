import {
  afterRenderEffect,
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  ElementRef,
  inject,
  input,
} from '@angular/core';
import { KeyPlaces } from './key-places';
import { LeadsTo } from './leads-to';

/** A letter on a figure that stands beside the same letter in the margin. */
export interface KeyOfNote {
  readonly letter: string;
  /** What the note says, in a few words. */
  readonly about: string;
}

/** Where a key stands, from the upper left corner of the box that it lies in. */
export interface KeyPoint {
  readonly xPx: number;
  readonly yPx: number;
}

/** A key: a link to its note. Placed on a drawing by its middle; without a place it stands in the line of the text. */
@Component({
  selector: 'app-figure-key',
  imports: [LeadsTo],
  template: `
    <a
      class="key"
      [attr.id]="'key-' + key().letter"
      [appLeadsTo]="'note-' + key().letter"
      [attr.aria-label]="'Note ' + key().letter + ': ' + key().about"
      >{{ key().letter }}</a
    >
  `,
  styleUrl: './figure-key.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: {
    '[class.placed]': 'at() !== null',
    '[style.left.px]': 'at()?.xPx',
    '[style.top.px]': 'at()?.yPx',
  },
})
export class FigureKey {
  readonly key = input.required<KeyOfNote>();
  readonly at = input.required<KeyPoint | null>();

  constructor() {
    const places = inject(KeyPlaces);
    const element = inject<ElementRef<HTMLElement>>(ElementRef).nativeElement;
    let standing: string | null = null;
    const leave = (): void => {
      if (standing !== null) places.remove(standing, element);
    };
    afterRenderEffect(() => {
      this.at();
      const { letter } = this.key();
      if (standing !== letter) leave();
      standing = letter;
      places.set(letter, element);
    });
    inject(DestroyRef).onDestroy(leave);
  }
}

import { Injectable, signal } from '@angular/core';

/** Where the keys of a page stand, for the margin that places its notes beside them. */
@Injectable({ providedIn: 'root' })
export class KeyPlaces {
  private readonly elements = new Map<string, HTMLElement>();
  private readonly moves = signal(0);

  /** Changes whenever a key comes, goes or moves. */
  readonly moved = this.moves.asReadonly();

  set(letter: string, element: HTMLElement): void {
    this.elements.set(letter, element);
    this.moves.update((count) => count + 1);
  }

  remove(letter: string, element: HTMLElement): void {
    if (this.elements.get(letter) !== element) return; // another key has taken the letter over
    this.elements.delete(letter);
    this.moves.update((count) => count + 1);
  }

  /** The middle of a key, in pixels of the viewport; null where it does not stand. */
  middlePx(letter: string): number | null {
    const box = this.elements.get(letter)?.getBoundingClientRect();
    return box ? box.top + box.height / 2 : null;
  }
}

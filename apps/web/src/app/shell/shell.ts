import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  inject,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { NavigationEnd, Router, RouterOutlet } from '@angular/router';
import { filter, map, pairwise } from 'rxjs';
import { RunningHead } from './running-head';

/** Running head, page, foot. */
@Component({
  selector: 'app-shell',
  imports: [RouterOutlet, RunningHead],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  private readonly content = viewChild.required<ElementRef<HTMLElement>>('content');

  constructor() {
    // A new page takes the focus, as a page load would; a change of query or fragment alone leaves it where it is.
    inject(Router)
      .events.pipe(
        filter((event) => event instanceof NavigationEnd),
        map((event) => event.urlAfterRedirects.replace(/[?#].*/, '')),
        pairwise(),
        filter(([before, now]) => before !== now),
        takeUntilDestroyed(),
      )
      .subscribe(() => {
        this.focusContent();
      });
  }

  protected focusContent(): void {
    this.content().nativeElement.focus({ preventScroll: true });
  }
}

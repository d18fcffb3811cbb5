import { LiveAnnouncer } from '@angular/cdk/a11y';
import { inject, Injectable } from '@angular/core';
import { Title } from '@angular/platform-browser';
import { type RouterStateSnapshot, TitleStrategy } from '@angular/router';

/** "Rigs · Stillpier" in the window, and read out when the page changes. */
@Injectable({ providedIn: 'root' })
export class PageTitle extends TitleStrategy {
  private readonly title = inject(Title);
  private readonly announcer = inject(LiveAnnouncer);
  private last: string | null = null;

  override updateTitle(state: RouterStateSnapshot): void {
    const page = this.buildTitle(state);
    const title = page === undefined ? 'Stillpier' : `${page} · Stillpier`;
    this.title.setTitle(title);
    // The first page is read out by the browser.
    if (this.last !== null && this.last !== title) void this.announcer.announce(title);
    this.last = title;
  }
}

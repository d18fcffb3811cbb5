import { ChangeDetectionStrategy, Component, computed, inject, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatDivider } from '@angular/material/divider';
import { MatMenu, MatMenuItem, MatMenuTrigger } from '@angular/material/menu';
import { RouterLink, RouterLinkActive } from '@angular/router';
import { RigsApi } from '../api/rigs-api';
import { SessionApi } from '../api/session-api';
import { CurrentRig } from './current-rig';
import { SignOut } from './sign-out';
import { THEME_NAMES, ThemeChoice } from './theme-choice';
import { ThemeSwitch } from './theme-switch';
import { Wordmark } from './wordmark';

/** The top of every page: mark, rig, pages of the rig, theme, Add logs, person. On narrow screens most go into a menu. */
@Component({
  selector: 'app-running-head',
  imports: [
    MatButton,
    MatDivider,
    MatMenu,
    MatMenuItem,
    MatMenuTrigger,
    RouterLink,
    RouterLinkActive,
    ThemeSwitch,
    Wordmark,
  ],
  templateUrl: './running-head.html',
  styleUrl: './running-head.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunningHead {
  private readonly rigsApi = inject(RigsApi);
  protected readonly theme = inject(ThemeChoice);
  protected readonly signOut = inject(SignOut);

  /** The person wants to go past the head. */
  readonly skip = output();

  protected readonly themes = THEME_NAMES;
  protected readonly account = inject(SessionApi).account;
  protected readonly rig = inject(CurrentRig).rig;
  protected readonly rigs = computed(() =>
    this.rigsApi.list.hasValue() ? this.rigsApi.list.value() : [],
  );
  /** The rigs that logs may be added to from here: the one of the page, else all that are not just advised. */
  protected readonly rigsForLogs = computed(() => {
    const rig = this.rig();
    return (rig ? [rig] : this.rigs()).filter(({ role }) => role !== 'advisor');
  });
  protected readonly initials = computed(() =>
    (this.account()?.name ?? '')
      .split(/\s+/)
      .map((word) => word.charAt(0))
      .slice(0, 2)
      .join('')
      .toUpperCase(),
  );
}

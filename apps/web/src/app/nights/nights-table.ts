import { ChangeDetectionStrategy, Component, computed, input, signal } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatSort, MatSortHeader, type Sort } from '@angular/material/sort';
import { MatTableModule } from '@angular/material/table';
import { RouterLink } from '@angular/router';
import type { NightSummary } from '@stillpier/contract';
import { dayText } from '../figures/clock';
import { arcsecText, hoursText, percentText, ratioText } from '../figures/measure-text';
import { RoundelGlyph } from '../figures/roundel/roundel-glyph';
import { FINDING_NAMES } from '../night/finding-names';
import { Severity } from '../page/severity';

const WIDE = ['date', 'targets', 'hours', 'ra', 'dec', 'total', 'star', 'aspect', 'kept', 'limit'];
/** DESIGN §8: what is dropped shows when the row is opened. */
const NARROW = ['date', 'ra', 'star', 'kept', 'more'];

const SORT_VALUES: Record<string, (night: NightSummary) => string | number | null> = {
  date: (night) => night.date,
  targets: (night) => night.targets.join(' '),
  hours: (night) => night.guidedHours,
  ra: (night) => night.raRmsArcsec,
  dec: (night) => night.decRmsArcsec,
  total: (night) => night.totalRmsArcsec,
  aspect: (night) => night.aspect,
  kept: (night) => night.keptShare,
  limit: (night) => night.mainLimit && FINDING_NAMES[night.mainLimit.code],
};

@Component({
  selector: 'app-nights-table',
  imports: [MatButton, MatSort, MatSortHeader, MatTableModule, RoundelGlyph, RouterLink, Severity],
  templateUrl: './nights-table.html',
  styleUrl: './nights-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NightsTable {
  readonly rigId = input.required<string>();
  readonly nights = input.required<readonly NightSummary[]>();
  readonly narrow = input.required<boolean>();

  protected readonly columns = computed(() => (this.narrow() ? NARROW : WIDE));
  protected readonly sort = signal<Sort>({ active: 'date', direction: 'desc' });
  protected readonly opened = signal<string | null>(null);

  protected readonly rows = computed(() => {
    const { active, direction } = this.sort();
    const value = SORT_VALUES[active];
    const sorted = value ? [...this.nights()].sort((a, b) => compare(value(a), value(b))) : [];
    const ordered = direction === 'desc' ? sorted.reverse() : sorted;
    // A night without the value has no place in the order: it stands at the end either way.
    return value
      ? [
          ...ordered.filter((night) => value(night) !== null),
          ...ordered.filter((night) => value(night) === null),
        ]
      : [...this.nights()];
  });

  protected readonly day = dayText;
  protected readonly arcsec = arcsecText;
  protected readonly hours = hoursText;
  protected readonly percent = percentText;
  protected readonly ratio = ratioText;

  /** A name does not break across lines. */
  protected targetsOf({ targets }: NightSummary): string {
    return targets.map((target) => target.replaceAll(' ', '\u00a0')).join(' · ');
  }

  protected limitName({ mainLimit }: NightSummary): string {
    return mainLimit ? FINDING_NAMES[mainLimit.code] : 'no verdict';
  }

  protected toggle(night: NightSummary): void {
    this.opened.update((date) => (date === night.date ? null : night.date));
  }

  protected readonly byDate = (_index: number, night: NightSummary): string => night.date;
  protected readonly isOpened = (_index: number, night: NightSummary): boolean =>
    this.narrow() && this.opened() === night.date;
}

function compare(a: string | number | null, b: string | number | null): number {
  if (typeof a === 'string' && typeof b === 'string') return a.localeCompare(b);
  return Number(a) - Number(b);
}

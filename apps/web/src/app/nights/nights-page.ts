import { BreakpointObserver } from '@angular/cdk/layout';
import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { FormControl, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { NightSummary } from '@stillpier/contract';
import { map } from 'rxjs';
import { NightsApi } from '../api/nights-api';
import { RigsApi } from '../api/rigs-api';
import { arcsecText, countedText, hoursText } from '../figures/measure-text';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FINDING_NAMES } from '../night/finding-names';
import { Emphasis } from '../page/emphasis';
import { Failure } from '../page/failure';
import { saveFile } from '../page/save-file';
import { Waiting } from '../page/waiting';
import { NightsTable } from './nights-table';
import { nightsCsv } from './nights-csv';
import { YearStrip } from './year-strip';

/** All nights of a rig: what was gathered, how it went, and what limited it. */
@Component({
  selector: 'app-nights-page',
  imports: [
    Emphasis,
    Failure,
    Field,
    FieldInput,
    MatButton,
    NightsTable,
    ReactiveFormsModule,
    RouterLink,
    Waiting,
    YearStrip,
  ],
  templateUrl: './nights-page.html',
  styleUrl: './nights-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled' },
})
export class NightsPage {
  readonly rigId = input.required<string>();

  protected readonly nights = inject(NightsApi).list(this.rigId);
  private readonly rigs = inject(RigsApi).list;
  protected readonly rig = computed(() =>
    this.rigs.hasValue() ? this.rigs.value().find((rig) => rig.id === this.rigId()) : undefined,
  );
  protected readonly mayUpload = computed(() => this.rig()?.role !== 'advisor');
  private readonly breakpoints = inject(BreakpointObserver);
  protected readonly narrow = toSignal(
    this.breakpoints.observe('(max-width: 700px)').pipe(map((state) => state.matches)),
    { initialValue: false },
  );

  protected readonly wordsControl = new FormControl('', { nonNullable: true });
  protected readonly limitControl = new FormControl('', { nonNullable: true });
  private readonly words = toSignal(this.wordsControl.valueChanges, { initialValue: '' });
  private readonly limit = toSignal(this.limitControl.valueChanges, { initialValue: '' });

  protected readonly all = computed(() => (this.nights.hasValue() ? this.nights.value() : []));
  protected readonly limits = computed(() =>
    [...new Set(this.all().flatMap((night) => night.mainLimit?.code ?? []))]
      .map((code) => ({ code, name: FINDING_NAMES[code] }))
      .sort((a, b) => a.name.localeCompare(b.name)),
  );
  protected readonly shown = computed(() => {
    const words = this.words().trim().toLowerCase();
    const limit = this.limit();
    return this.all().filter(
      (night) =>
        (limit === '' || night.mainLimit?.code === limit) &&
        `${night.date} ${night.targets.join(' ')}`.toLowerCase().includes(words),
    );
  });
  protected readonly shownText = computed(() =>
    this.shown().length === this.all().length
      ? countedText(this.all().length, 'night', 'nights')
      : `${this.shown().length} of ${countedText(this.all().length, 'night', 'nights')}`,
  );

  protected readonly sentence = computed(() => sentenceOf(this.all()));
  protected clearFilter(): void {
    this.wordsControl.setValue('');
    this.limitControl.setValue('');
  }

  protected saveCsv(): void {
    saveFile('nights.csv', nightsCsv(this.shown()), 'text/csv;charset=utf-8');
  }
}

/** Sums and picks what the list holds; measures are the nights' own. */
function sentenceOf(nights: readonly NightSummary[]) {
  const [last] = nights;
  const hours = nights.reduce((sum, night) => sum + night.guidedHours, 0);
  const plain = (text: string) => ({ text, strong: false });
  const strong = (text: string) => ({ text, strong: true });
  return [
    strong(countedText(nights.length, 'night', 'nights')),
    plain(' with '),
    strong(hoursText(hours)),
    plain(' of guiding.'),
    ...(last && last.totalRmsArcsec !== null
      ? [
          plain(' The last one ran at '),
          strong(arcsecText(last.totalRmsArcsec)),
          plain(' total RMS.'),
        ]
      : []),
  ];
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { LeadsTo } from '../figures/figure-key/leads-to';
import { Severity } from '../page/severity';
import type { FindingNote } from './page-notes';

const WORDS = { act: 'to act on', watch: 'to watch', fine: 'fine' } as const;

/** How many findings of a run are to act on, to watch, and fine; each count leads to its first note. */
@Component({
  selector: 'app-tally',
  imports: [LeadsTo, Severity],
  template: `
    <p class="of">{{ of() }}</p>
    <p class="tally">
      @for (count of counts(); track count.level) {
        @if (count.first; as id) {
          <a [appLeadsTo]="id">
            <app-severity [level]="count.level" [words]="count.text" />
          </a>
        } @else {
          <app-severity [level]="count.level" [words]="count.text" />
        }
      }
    </p>
  `,
  styles: `
    .of {
      margin-bottom: 6px;
      color: var(--ink-2);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Tally {
  readonly notes = input.required<readonly FindingNote[]>();
  /** The run, by its title. */
  readonly of = input.required<string>();

  protected readonly counts = computed(() =>
    (['act', 'watch', 'fine'] as const).map((level) => {
      const notes = this.notes().filter(({ finding }) => finding.severity === level);
      return { level, text: `${notes.length} ${WORDS[level]}`, first: notes[0]?.id };
    }),
  );
}

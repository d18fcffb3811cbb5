import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Finding } from '@stillpier/contract';
import { Severity } from '../page/severity';

const WORDS = { act: 'to act on', watch: 'to watch', fine: 'fine' } as const;

/** How many findings of a run are to act on, to watch, and fine. */
@Component({
  selector: 'app-tally',
  imports: [Severity],
  template: `
    <p class="of">{{ of() }}</p>
    <p class="tally">
      @for (count of counts(); track count.level) {
        <app-severity [level]="count.level" [words]="count.text" />
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
  readonly findings = input.required<readonly Finding[]>();
  /** The run, by its title. */
  readonly of = input.required<string>();

  protected readonly counts = computed(() =>
    (['act', 'watch', 'fine'] as const).map((level) => {
      const count = this.findings().filter((finding) => finding.severity === level).length;
      return { level, text: `${count} ${WORDS[level]}` };
    }),
  );
}

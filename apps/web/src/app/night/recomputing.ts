import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
} from '@angular/core';
import type { Night } from '@stillpier/contract';
import { percentText } from '../figures/measure-text';
import { isBeingRead, NightLogs } from './night-logs';

/** Says of which logs the figures are being computed anew, and when the new ones stand. */
@Component({
  selector: 'app-recomputing',
  template: `
    <div role="status">
      @for (log of working(); track log.id) {
        <p>
          The figures of {{ log.fileName }} are being computed anew: {{ log.stage }},
          <span class="n">{{ percent(log.progress) }}</span>. Until they stand, the earlier ones are
          shown.
        </p>
      }
    </div>
  `,
  styles: `
    p {
      max-width: 720px;
      margin-top: 16px;
      padding: 2px 0 2px 16px;
      border-left: 3px solid var(--ink);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Recomputing {
  private readonly nightLogs = inject(NightLogs);

  readonly rigId = input.required<string>();
  readonly logs = input.required<Night['logs']>();
  /** New figures are there to be loaded. */
  readonly stood = output();

  protected readonly percent = percentText;
  private readonly seen = computed(() =>
    this.logs()
      .map(({ importId }) => this.nightLogs.of(importId))
      .filter((log) => log !== undefined),
  );
  protected readonly working = computed(() => this.seen().filter(isBeingRead));
  private readonly workingBefore = new Set<string>();

  constructor() {
    effect(() => {
      this.nightLogs.rigId.set(this.rigId());
    });
    effect(() => {
      for (const log of this.seen()) {
        if (isBeingRead(log)) this.workingBefore.add(log.id);
        else if (this.workingBefore.delete(log.id) && log.state === 'done') this.stood.emit();
      }
    });
  }
}

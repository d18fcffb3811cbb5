import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import type { LogImport } from '@stillpier/contract';
import { ImportsApi } from '../api/imports-api';
import { countedText, countText } from '../figures/measure-text';
import { Severity } from '../page/severity';

const MOST_SHOWN = 6;

/** In the margin: what to look at in a log that was read, and the first lines that were left out. */
@Component({
  selector: 'app-reading-notes',
  imports: [RouterLink, Severity],
  template: `
    @if (reading(); as read) {
      @for (warning of read.warnings; track $index) {
        <div class="note">
          <app-severity level="watch" words="To look at" />
          <p>{{ warning }}</p>
        </div>
      }
      @if (read.refusedCount > 0) {
        <div class="note">
          <app-severity level="watch" [words]="refusedText()" />
          <h3>Left out, with the reason</h3>
          <dl class="gain">
            @for (refused of first(); track refused.line) {
              <dt>line {{ count(refused.line) }}</dt>
              <dd>{{ refused.reason }}</dd>
            }
          </dl>
          <p><a [routerLink]="['/rigs', log().rigId, 'import', log().id]">All lines left out</a></p>
        </div>
      }
    }
  `,
  styles: `
    :host {
      display: block;
    }
    dl + p {
      margin-top: 8px;
    }
    dd {
      overflow-wrap: anywhere;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingNotes {
  readonly log = input.required<LogImport>();

  private readonly loaded = inject(ImportsApi).reading(this.log);
  protected readonly reading = computed(() =>
    this.loaded.hasValue() ? this.loaded.value() : undefined,
  );
  protected readonly first = computed(() => this.reading()?.refused.slice(0, MOST_SHOWN) ?? []);
  protected readonly refusedText = computed(
    () => `${countedText(this.reading()?.refusedCount ?? 0, 'line', 'lines')} refused`,
  );
  protected readonly count = countText;
}

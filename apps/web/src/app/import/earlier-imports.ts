import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { LogImport } from '@stillpier/contract';
import { dayText, localDateTimeText } from '../figures/clock';
import { bytesText } from '../figures/measure-text';
import { Severity } from '../page/severity';
import { stateOfImport } from './file-list';
import { Progress } from './progress';

/** What was sent to the rig before, newest first. */
@Component({
  selector: 'app-earlier-imports',
  imports: [MatButton, Progress, RouterLink, Severity],
  templateUrl: './earlier-imports.html',
  styleUrl: './earlier-imports.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class EarlierImports {
  readonly rigId = input.required<string>();
  readonly imports = input.required<readonly LogImport[]>();
  readonly timeZone = input.required<string>();
  readonly mayUpload = input.required<boolean>();
  readonly mayDelete = input.required<boolean>();
  readonly readAgain = output<LogImport>();
  readonly remove = output<LogImport>();

  protected readonly rows = computed(() =>
    this.imports().map((of) => ({
      of,
      added: dayText(localDateTimeText(Date.parse(of.createdAt), this.timeZone()).slice(0, 10)),
      size: bytesText(of.sizeBytes),
      state: stateOfImport(of),
    })),
  );

  protected readonly day = dayText;
}

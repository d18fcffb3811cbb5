import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { Finding } from '@stillpier/contract';
import { arcsecText, ratioText } from '../figures/measure-text';
import { Severity } from '../page/severity';
import { figureOf, type Figure } from './finding-names';

/** The findings that speak about one figure, in the margin beside it. */
@Component({
  selector: 'app-notes-of',
  imports: [Severity],
  templateUrl: './notes-of.html',
  styles: `
    .caution {
      margin-top: 10px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { role: 'complementary', '[attr.aria-label]': 'label()' },
})
export class NotesOf {
  readonly figure = input.required<Figure>();
  /** All of the run; those that speak about another figure are left out. */
  readonly findings = input.required<readonly Finding[]>();

  protected readonly label = computed(() => `Findings beside the figure of the ${this.figure()}`);
  protected readonly notes = computed(() =>
    this.findings()
      .filter((finding) => figureOf(finding) === this.figure())
      .map((finding) => ({ ...finding, gains: gainsOf(finding) })),
  );
}

function gainsOf({ gain }: Finding): { label: string; value: string }[] {
  if (!gain) return [];
  return [
    ...(gain.rmsIfCuredArcsec === null
      ? []
      : [{ label: 'RMS without it', value: arcsecText(gain.rmsIfCuredArcsec) }]),
    ...(gain.aspectIfCured === null
      ? []
      : [{ label: 'aspect without it', value: ratioText(gain.aspectIfCured) }]),
  ];
}

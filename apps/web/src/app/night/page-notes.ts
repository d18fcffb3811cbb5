import type { Finding, Run } from '@stillpier/contract';
import type { KeyOfNote } from '../figures/figure-key/figure-key';
import { FIGURES, figureOf, type Figure } from './finding-names';
import type { ShownRun } from './shown-run';

/** A finding in the margin with the letter that it shares with the figure; null where the figure is not drawn. */
export interface FindingNote {
  readonly id: string;
  readonly figure: Figure;
  readonly key: KeyOfNote | null;
  readonly axis: 'ra' | 'dec';
  readonly finding: Finding;
}

/** Down the table of the mount's measures, so that notes stand in the order of their rows. */
const MOUNT_ROWS: readonly Finding['code'][] = [
  'drift',
  'polar-alignment',
  'backlash',
  'stiction',
  'response-off',
  'response-asymmetry',
];

/** The findings of a run in the order in which the page shows them, lettered a, b, c through the page. */
export function findingNotes(shown: ShownRun): FindingNote[] {
  const { findings } = shown.of.run;
  let letters = 0;
  return FIGURES.flatMap((figure) => {
    const keyed = isDrawn(figure, shown);
    return findings
      .filter((finding) => figureOf(finding) === figure)
      .sort((a, b) => MOUNT_ROWS.indexOf(a.code) - MOUNT_ROWS.indexOf(b.code))
      .map((finding, i) => {
        const letter = letterOf(letters);
        if (keyed) letters += 1;
        return {
          id: keyed ? `note-${letter}` : `note-${figure}-${i}`,
          figure,
          key: keyed ? { letter, about: finding.sentence } : null,
          axis: axisOf(finding),
          finding,
        };
      });
  });
}

/** a to z, then aa, ab and so on. */
export function letterOf(index: number): string {
  const last = String.fromCharCode(97 + (index % 26));
  return index < 26 ? last : letterOf(Math.floor(index / 26) - 1) + last;
}

/** Sentences name their axis; those that name both or none speak of RA first. */
function axisOf({ sentence }: Finding): 'ra' | 'dec' {
  return /\bDec\b/.test(sentence) && !/\bRA\b/.test(sentence) ? 'dec' : 'ra';
}

function isDrawn(figure: Figure, { startMs, of: { run, seeingFwhmArcsec } }: ShownRun): boolean {
  const drawn: Record<Figure, boolean> = {
    night: startMs !== null,
    star: run.footprint !== null && seeingFwhmArcsec !== null,
    budget: run.budget !== null && run.ra !== null && run.dec !== null,
    trace: run.ra !== null,
    spectrum: run.spectrum !== null,
    worm: run.periodicError !== null,
    mount: true,
  };
  return drawn[figure];
}

/** The notes of one figure that have a key on it. */
export function keyedOn(
  figure: Figure,
  notes: readonly FindingNote[],
): (FindingNote & { readonly key: KeyOfNote })[] {
  return notes.flatMap((note) =>
    note.figure === figure && note.key ? [{ ...note, key: note.key }] : [],
  );
}

/** The period that a finding about a line speaks of: the strongest lines of its axis and kind, one a finding. */
export function periodOf(
  note: FindingNote,
  notes: readonly FindingNote[],
  run: Run,
): number | null {
  const { code } = note.finding;
  const alike = notes.filter((each) => each.finding.code === code && each.axis === note.axis);
  const peaks = (run.spectrum?.[note.axis].peaks ?? [])
    .filter(({ label }) =>
      code === 'unnamed-line' ? label === null : label !== null && !label.startsWith('worm'),
    )
    .sort((a, b) => b.share - a.share);
  return peaks[alike.indexOf(note)]?.periodSeconds ?? null;
}

import type { Finding, NightRun } from '@stillpier/contract';
import { findingNotes, keyedOn, letterOf } from './page-notes';
import type { ShownRun } from './shown-run';

const finding = (code: Finding['code'], sentence = 'RA swings.'): Finding => ({
  ...{ code, severity: 'watch', sentence, evidence: [], nextStep: '', gain: null, caution: null },
});

function shown(findings: Finding[], more: object = {}): ShownRun {
  const run = { findings, ra: {}, footprint: null, budget: null, spectrum: null, ...more };
  const of = { seeingFwhmArcsec: 2, run } as unknown as NightRun;
  return { id: 'r', number: 1, name: 'M 33', startMs: 0, of };
}

describe('the notes of a page', () => {
  it('are lettered in the order of the figures, and within the table of the mount by its rows', () => {
    const notes = findingNotes(
      shown([finding('backlash'), finding('gusts'), finding('drift'), finding('star-lost')]),
    );
    expect(notes.map(({ key, finding: { code } }) => `${key?.letter} ${code}`)).toEqual([
      'a star-lost',
      'b gusts',
      'c drift',
      'd backlash',
    ]);
  });

  it('have no letter beside a figure that is not drawn, and leave none out', () => {
    const notes = findingNotes(shown([finding('over-correction'), finding('drift')]));
    expect(notes.map(({ key }) => key?.letter ?? null)).toEqual([null, 'a']);
    expect(keyedOn('budget', notes)).toEqual([]);
    expect(keyedOn('mount', notes)[0]?.id).toBe('note-a');
  });

  it('belong to the axis that their sentence names', () => {
    const [dec, both] = findingNotes(
      shown([finding('drift', 'Dec drifts.'), finding('polar-alignment', 'RA and Dec drift.')]),
    );
    expect([dec?.axis, both?.axis]).toEqual(['dec', 'ra']);
  });

  it('go on with aa after z', () => {
    expect([0, 25, 26, 27, 52].map(letterOf)).toEqual(['a', 'z', 'aa', 'ab', 'ba']);
  });
});

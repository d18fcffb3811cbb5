import type { NightRun } from '@stillpier/contract';
import { leadingRun, runTitle, shownRuns } from './shown-run';

const runOf = (id: string, start: string | null, used: number, target: string | null) =>
  ({ id, run: { index: 1, start, used, target } }) as NightRun;

const RUNS = [
  runOf('late', '2026-11-28T22:00:00Z', 3000, 'M 81'),
  runOf('undated', null, 10, null),
  runOf('early', '2026-11-28T18:00:00Z', 2000, null),
];

describe('shown runs', () => {
  it('are numbered through the night, whatever log they came from', () => {
    const shown = shownRuns(RUNS);
    expect(shown.map(({ id, number }) => [id, number])).toEqual([
      ['early', 1],
      ['late', 2],
      ['undated', 3],
    ]);
    expect(shown.map(runTitle)).toEqual(['Run 1', 'Run 2, M 81', 'Run 3']);
  });

  it('lead with the run that has the most frames in its numbers', () => {
    expect(leadingRun(shownRuns(RUNS))?.id).toBe('late');
    expect(leadingRun([])).toBeUndefined();
  });
});

import {
  analyseLogWithSeries,
  PLAIN_NIGHT,
  simulateNight,
  subForecast,
  type Reading,
} from '@stillpier/analysis';
import type { NightRun } from '@stillpier/contract';
import type { RunStretch } from '../api/run-stretch';
import type { ShownRun } from './shown-run';
import { forecastRuns, subFrames } from './sub-forecasts';

const READING: Reading = {
  ...{ lines: 0, frames: 0, refusedCount: 0, refused: [], delimiter: ',', decimal: '.' },
  ...{ encoding: 'utf-8', headerLine: 1, columns: {}, warnings: [] },
};

/** A night as the server answers it: the document, and the frames rounded to Float32. */
function analysedNight() {
  const { frames } = simulateNight({ ...PLAIN_NIGHT, dithers: DITHERS }, 7);
  const rig = { seeingFwhmArcsec: 2, keepAspect: 1.05 };
  const { document, runs } = analyseLogWithSeries(frames, READING, rig, { subSeconds: 300 });
  const [run] = document.runs;
  const series = runs[0]?.series;
  if (!run?.subs || !series) throw new Error('The simulated night has no run');
  const ra = Float32Array.from(series.raErrorArcsec);
  const dec = Float32Array.from(series.decErrorArcsec);
  const stretch: RunStretch = {
    ...{ fromSeconds: 0, toSeconds: run.durationSeconds, thinned: false },
    timeSeconds: Float64Array.from(Float32Array.from(series.timeSeconds)),
    ra: { leastArcsec: ra, greatestArcsec: ra },
    dec: { leastArcsec: dec, greatestArcsec: dec },
    setAside: series.setAside,
  };
  const of = { seeingFwhmArcsec: 2, run } as unknown as NightRun;
  const shown: ShownRun = { id: 'r', number: 1, name: 'M 33', startMs: 0, of };
  return { run, subs: run.subs, stretch, shown };
}
const DITHERS = { everySeconds: 600, sizeArcsec: 4, settledArcsec: 1.5 };

describe('the sub forecast in the page', () => {
  it('gives the numbers of the document at the length of the document', () => {
    const { run, subs, stretch } = analysedNight();
    const worked = subForecast(subFrames(run, stretch), 300, 2, subs.keepAspect);
    expect(worked.count).toBe(subs.count);
    expect(worked.within).toBe(subs.within);
    expect(worked.count).toBeGreaterThan(3);
    // Float32 holds seven digits, and 0.0005 s in the times of a night of two hours
    worked.aspects.forEach((aspect, i) => {
      expect(aspect).toBeCloseTo(subs.aspects[i] ?? NaN, 5);
    });
    worked.startsSeconds.forEach((start, i) => {
      expect(start).toBeCloseTo(subs.startsSeconds[i] ?? NaN, 2);
    });
  });

  it('works out every length that is asked for, and the longest of which nine in ten are kept', async () => {
    const { subs, stretch, shown } = analysedNight();
    const { signal } = new AbortController();
    const forecasts = await forecastRuns([shown], new Map([['r', stretch]]), [60, 300], signal);
    const found = forecasts.get('r');
    expect(found?.byLength.get(300)).toBe(subs); // the document's own
    expect(found?.byLength.get(60)?.count).toBeGreaterThan(3 * subs.count);
    const longest = found?.longestSeconds ?? 0;
    const { run } = shown.of;
    const share = (seconds: number) => {
      const at = subForecast(subFrames(run, stretch), seconds, 2, subs.keepAspect);
      return at.count < 3 ? 0 : at.within / at.count;
    };
    expect(longest % 30).toBe(0);
    expect(share(longest)).toBeGreaterThanOrEqual(0.9);
    expect(share(longest + 30)).toBeLessThan(0.9);
  });

  it('leaves out a run whose frames are not there', async () => {
    const { shown } = analysedNight();
    const { signal } = new AbortController();
    expect((await forecastRuns([shown], new Map(), [300], signal)).size).toBe(0);
  });

  it('stops when it is no longer wanted', async () => {
    const { shown, stretch } = analysedNight();
    const work = forecastRuns([shown], new Map([['r', stretch]]), [60], AbortSignal.abort());
    await expect(work).rejects.toThrow();
  });
});

import { cutRuns, type LogFrames, type RunByHand } from '@stillpier/analysis';
import type { Stretch } from '../by-hand/stretches';

/** A frame that stands on the edge of a stretch falls on the side that was meant, whatever the last digits say. */
const SLACK_SECONDS = 0.0005;

/** Where each run of a log begins, in seconds since the first frame of the log. */
export function runOffsets(frames: LogFrames): number[] {
  return cutRuns(frames).map(({ from }) => frames.timeSeconds[from] ?? 0);
}

/** Stretches of a log as the analysis takes them: by run, in seconds of the run. */
export function runsByHand(
  offsetsSeconds: readonly number[],
  stretches: readonly Stretch[],
): RunByHand[] {
  return offsetsSeconds.flatMap((offset, i) =>
    stretches.map(({ fromSeconds, toSeconds }) => ({
      run: i + 1,
      fromSeconds: fromSeconds - offset - SLACK_SECONDS,
      toSeconds: toSeconds - offset - SLACK_SECONDS,
    })),
  );
}

import type { RunStretch } from '../api/run-stretch';
import { stretchFigures } from './stretch-figures';

const ra = Float32Array.of(9, 1, 3, 50, 1, 3, 9);
const dec = Float32Array.of(9, 2, 2, 50, 4, 4, 9);
const frames: RunStretch = {
  ...{ fromSeconds: 0, toSeconds: 12, thinned: false },
  timeSeconds: Float64Array.of(0, 2, 4, 6, 8, 10, 12),
  ra: { leastArcsec: ra, greatestArcsec: ra },
  dec: { leastArcsec: dec, greatestArcsec: dec },
  setAside: Uint8Array.of(0, 0, 0, 1, 0, 0, 0),
};

describe('the figures of a stretch', () => {
  it('are the RMS about the mean of its frames that count, the end left out', () => {
    // RA 1, 3, 1, 3 and Dec 2, 2, 4, 4: each a deviation of 1 from its mean
    expect(stretchFigures(frames, { fromSeconds: 2, toSeconds: 12 })).toEqual({
      ...{ frames: 5, used: 4, raRmsArcsec: 1, decRmsArcsec: 1, totalRmsArcsec: Math.SQRT2 },
    });
  });

  it('are none where all frames are set aside', () => {
    expect(stretchFigures(frames, { fromSeconds: 6, toSeconds: 8 })).toEqual({
      ...{ frames: 1, used: 0, raRmsArcsec: null, decRmsArcsec: null, totalRmsArcsec: null },
    });
  });
});

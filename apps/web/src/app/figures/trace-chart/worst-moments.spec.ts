import { worstMoments } from './worst-moments';

const ra = Float32Array.of(0.1, -3, 0.2, 0.1, 2.9, 9, NaN, 0.1);
const dec = Float32Array.of(0.2, 1, 0.1, -2, 0, 0, NaN, 0.1);
const stretch = {
  fromSeconds: 0,
  toSeconds: 70,
  thinned: false,
  timeSeconds: Float64Array.of(0, 10, 20, 30, 40, 50, 60, 70),
  ra: { leastArcsec: ra, greatestArcsec: ra },
  dec: { leastArcsec: dec, greatestArcsec: dec },
  setAside: Uint8Array.of(0, 0, 0, 0, 0, 1, 0, 0),
};

describe('the worst moments of a run', () => {
  it('are the largest kept errors of either axis, worst first', () => {
    expect(worstMoments(stretch, 3, 0)).toEqual([
      { seconds: 10, axis: 'ra', errorArcsec: -3 },
      { seconds: 40, axis: 'ra', errorArcsec: expect.closeTo(2.9, 6) as number },
      { seconds: 30, axis: 'dec', errorArcsec: -2 },
    ]);
  });

  it('lie apart, so that one gust is one moment', () => {
    const moments = worstMoments(stretch, 3, 15).map(({ seconds }) => seconds);
    expect(moments).toEqual([10, 40, 70]); // 0, 20 and 30 s lie within 15 s of one of the first two
  });
});

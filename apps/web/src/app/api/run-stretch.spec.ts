import { joinedStretches, readRunStretch } from './run-stretch';

/** As the contract lays it out: n, thinned, times, then the columns. */
function answerOf(thinned: boolean, ...columns: number[][]): ArrayBuffer {
  const n = columns[0]!.length;
  const view = new DataView(new ArrayBuffer(8 + columns.length * n * 4));
  view.setUint32(0, n, true);
  view.setUint32(4, thinned ? 1 : 0, true);
  columns.flat().forEach((value, i) => {
    view.setFloat32(8 + i * 4, value, true);
  });
  return view.buffer;
}

describe('readRunStretch', () => {
  it('reads single frames, their times since the start of the run', () => {
    const answer = answerOf(false, [0, 2, 4], [0.5, NaN, -0.25], [1, 2, 3], [0, 3, 1]);
    const stretch = readRunStretch(answer, 600, 604);
    expect([...stretch.timeSeconds]).toEqual([600, 602, 604]);
    expect([...stretch.ra.leastArcsec]).toEqual([0.5, NaN, -0.25]);
    expect(stretch.ra.greatestArcsec).toBe(stretch.ra.leastArcsec);
    expect([...stretch.dec.leastArcsec]).toEqual([1, 2, 3]);
    expect([...stretch.setAside]).toEqual([0, 3, 1]);
  });

  it('reads least and greatest of thinned steps', () => {
    const answer = answerOf(true, [0, 60], [-1, -2], [1, 2], [-3, -4], [3, 4], [0, 0], [0, 2]);
    const stretch = readRunStretch(answer, 0, 120);
    expect(stretch.thinned).toBe(true);
    expect([...stretch.ra.leastArcsec]).toEqual([-1, -2]);
    expect([...stretch.ra.greatestArcsec]).toEqual([1, 2]);
    expect([...stretch.dec.greatestArcsec]).toEqual([3, 4]);
    expect([...stretch.setAside]).toEqual([0, 2]); // the greatest code of the second step
  });

  it('refuses an answer that is cut off', () => {
    const whole = answerOf(false, [0, 2], [1, 2], [3, 4], [0, 0]);
    expect(() => readRunStretch(whole.slice(0, 30), 0, 2)).toThrow(RangeError);
  });
});

describe('joinedStretches', () => {
  it('puts stretches one after the other, a frame on their seam once', () => {
    const first = readRunStretch(answerOf(false, [0, 2, 4], [1, 2, 3], [4, 5, 6], [0, 0, 1]), 0, 4);
    const second = readRunStretch(answerOf(false, [0, 2], [3, 7], [6, 8], [1, 0]), 4, 8);
    const whole = joinedStretches([first, second]);
    expect([...whole.timeSeconds]).toEqual([0, 2, 4, 6]);
    expect([...whole.ra.leastArcsec]).toEqual([1, 2, 3, 7]);
    expect([...whole.dec.greatestArcsec]).toEqual([4, 5, 6, 8]);
    expect([...whole.setAside]).toEqual([0, 0, 1, 0]);
    expect([whole.fromSeconds, whole.toSeconds, whole.thinned]).toEqual([0, 8, false]);
  });
});

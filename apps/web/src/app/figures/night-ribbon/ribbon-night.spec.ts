import { envelopeColumns, subCells, type RibbonRun } from './ribbon-night';

const START = Date.UTC(2026, 10, 28, 20);

function runOf(ra: number[], cadenceSeconds: number): RibbonRun {
  const raArcsec = Float32Array.from(ra);
  const decArcsec = Float32Array.from(ra, () => 0.25);
  return {
    id: 'run',
    name: 'M 33',
    totalRmsArcsec: 0.8,
    startMs: START,
    durationSeconds: (ra.length - 1) * cadenceSeconds,
    stretch: {
      fromSeconds: 0,
      toSeconds: ra.length * cadenceSeconds,
      thinned: false,
      timeSeconds: Float64Array.from(ra, (_, i) => i * cadenceSeconds),
      ra: { leastArcsec: raArcsec, greatestArcsec: raArcsec },
      dec: { leastArcsec: decArcsec, greatestArcsec: decArcsec },
      setAside: Uint8Array.from(ra, () => 0),
    },
    setAside: [],
    subs: {
      lengthSeconds: 300,
      keepAspect: 1.15,
      aspects: [1.04, 1.15, 1.2],
      startsSeconds: [0, 300, 700],
    },
  };
}

describe('envelopeColumns', () => {
  it('gives the width that nine frames in ten stay inside, whatever their sign', () => {
    const frames = Array.from({ length: 20 }, (_, i) => (i % 2 === 0 ? 1 : -1) * (i + 1) * 0.0625);
    const [column] = envelopeColumns(runOf(frames, 1), 60_000);
    expect(column!.raArcsec).toBe(18 * 0.0625); // the 18th of 20 by size
    expect(column!.decArcsec).toBe(0.25);
  });

  it('leaves a step with fewer than 12 frames empty (DESIGN §6)', () => {
    const frames = Array.from({ length: 70 }, () => 1);
    const columns = envelopeColumns(runOf(frames, 1), 20_000);
    expect(columns.map((column) => (column.fromMs - START) / 1000)).toEqual([0, 20, 40]);
  });

  it('takes longer steps for a slow cadence', () => {
    const frames = Array.from({ length: 60 }, () => 1);
    const [first] = envelopeColumns(runOf(frames, 10), 60_000);
    expect(first!.toMs - first!.fromMs).toBe(180_000); // 13 frames of 10 s need three steps
  });
});

describe('subCells', () => {
  it('marks the subs over the keep limit, not those on it', () => {
    const cells = subCells(runOf([0, 0], 1));
    expect(cells.map((cell) => cell.over)).toEqual([false, false, true]);
    expect(cells[2]).toMatchObject({ fromMs: START + 700_000, toMs: START + 1_000_000 });
  });
});

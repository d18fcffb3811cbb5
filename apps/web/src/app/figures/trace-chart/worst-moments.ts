import type { TraceStretch } from './trace-stretch';

export interface WorstMoment {
  readonly seconds: number;
  readonly axis: 'ra' | 'dec';
  /** With its sign. */
  readonly errorArcsec: number;
}

/** The largest errors among the kept frames, worst first, no two closer to each other than `apartSeconds`. */
export function worstMoments(
  stretch: TraceStretch,
  most: number,
  apartSeconds: number,
): WorstMoment[] {
  const moments = [...stretch.timeSeconds.keys()]
    .filter((index) => stretch.setAside[index] === 0)
    .flatMap((index): WorstMoment[] => {
      const seconds = stretch.timeSeconds[index] ?? NaN;
      const ra = farther(stretch.ra.leastArcsec[index], stretch.ra.greatestArcsec[index]);
      const dec = farther(stretch.dec.leastArcsec[index], stretch.dec.greatestArcsec[index]);
      if (Number.isNaN(ra) || Number.isNaN(dec)) return [];
      return Math.abs(ra) >= Math.abs(dec)
        ? [{ seconds, axis: 'ra', errorArcsec: ra }]
        : [{ seconds, axis: 'dec', errorArcsec: dec }];
    })
    .sort((a, b) => Math.abs(b.errorArcsec) - Math.abs(a.errorArcsec));
  const worst: WorstMoment[] = [];
  for (const moment of moments) {
    if (worst.length === most) break;
    const near = worst.some((each) => Math.abs(each.seconds - moment.seconds) < apartSeconds);
    if (!near) worst.push(moment);
  }
  return worst;
}

function farther(least = NaN, greatest = NaN): number {
  return Math.abs(least) > Math.abs(greatest) ? least : greatest;
}

import type { CreateColumnMap, CreateRig, CreateSetup } from '@stillpier/contract';

export const EXAMPLE_RIG: CreateRig = {
  name: 'Orchard pier',
  mount: {
    kind: 'worm',
    wormTeeth: 180,
    wormPeriodSeconds: null,
    gearStages: [{ name: 'transfer gear', periodSeconds: 159.56 }],
    guideRateSidereal: 0.5,
  },
  site: { latitudeDegrees: 45, longitudeDegrees: -75, timeZone: 'America/Toronto' },
};

export const EXAMPLE_SETUP: CreateSetup = {
  name: 'Small refractor',
  imaging: { focalLengthMm: 530, apertureMm: 106, pixelUm: 3.76, binning: 1, sensor: 'mono' },
  filters: [{ name: 'H-alpha 7 nm', subSeconds: 600 }],
  guiding: { focalLengthMm: 200, apertureMm: 50, pixelUm: 3.75, binning: 1 },
  seeingFwhmArcsec: 2.5,
  subSeconds: 120,
  keepAspect: 1.15,
};

export const EXAMPLE_MAP: CreateColumnMap = {
  name: 'From the observatory computer',
  headerCells: ['when', 'east', 'north'],
  map: {
    columns: {
      when: { role: 'time', unit: 'iso' },
      east: { role: 'raError', unit: 'arcsec' },
      north: { role: 'decError', unit: 'arcsec' },
    },
  },
};

/** Instant of the first frame of `guideCsv`: an evening in March at the example rig. */
export const FIRST_FRAME = '2026-03-15T01:40:00Z';

/**
 * A guide log with recognised headers, a frame every two seconds. The errors are two sines and a little that is
 * different in every frame, so that no two logs of different `variant` are alike.
 */
export function guideCsv(frames: number, variant = 0, start = FIRST_FRAME): string {
  const lines = ['timestamp,ra_error_arcsec,dec_error_arcsec,ra_correction_ms,dec_correction_ms'];
  for (let i = 0; i < frames; i++) {
    const time = new Date(Date.parse(start) + i * 2000).toISOString();
    const ra = 0.8 * Math.sin((2 * Math.PI * i) / 120) + 0.3 * Math.sin(i * i + variant);
    const dec = 0.4 * Math.cos((2 * Math.PI * i) / 77) + 0.3 * Math.sin(i * i * 1.7 + variant);
    lines.push(`${time},${ra.toFixed(3)},${dec.toFixed(3)},${Math.round(-300 * ra)},0`);
  }
  return `${lines.join('\n')}\n`;
}

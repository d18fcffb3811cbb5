import type { RigDescription } from '@stillpier/analysis';

/** The invented rig of most samples. */
export const ORCHARD_PIER: RigDescription = {
  name: 'Orchard pier',
  mount: { kind: 'worm', wormTeeth: 180, guideRateSidereal: 0.5 },
  imaging: { focalLengthMm: 530, apertureMm: 106, pixelUm: 3.76, binning: 1, sensor: 'mono' },
  filters: [
    { name: 'H-alpha 7 nm', subSeconds: 600 },
    { name: 'Luminance', subSeconds: 180 },
  ],
  guiding: { focalLengthMm: 200, apertureMm: 50, pixelUm: 3.75, binning: 1 },
  seeingFwhmArcsec: 2.2,
  subSeconds: 300,
  keepAspect: 1.15,
  site: { latitudeDegrees: 45, longitudeDegrees: -75, timeZone: 'America/Toronto' },
};

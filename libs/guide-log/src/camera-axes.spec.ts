import { describe, expect, it } from 'vitest';
import { type Expected, HEADER, seen, utf8 } from '../../../test/support/small-guide-log';
import { type ColumnMap } from './column-map';
import { readGuideLog } from './log-reader';

const along = (map: ColumnMap, unit: 'arcsec' | 'guide px' = 'arcsec'): ColumnMap => ({
  columns: {
    t: { role: 'time', unit: 'seconds' },
    x: { role: 'xError', unit },
    y: { role: 'yError', unit },
  },
  ...map,
});

/** A star that went one step along x, and then one along y. */
const FILE = 't,x,y\n0,1,0\n1,0,1\n';
const root = Math.SQRT1_2;

// Expected: where the axes point, by the definition of the angle in CameraAxes; 45° by cos 45° = sin 45° = √½.
const CASES: [name: string, map: ColumnMap, ra: [number, number], dec: [number, number]][] = [
  ['0°: x is RA, y is Dec', { cameraAngleDegrees: 0 }, [1, 0], [0, 1]],
  ['90°: RA grows along y, Dec against x', { cameraAngleDegrees: 90 }, [0, 1], [-1, 0]],
  ['180°: north up in a picture', { cameraAngleDegrees: 180 }, [-1, 0], [0, -1]],
  ['-90°: RA grows against y, Dec along x', { cameraAngleDegrees: -90 }, [0, -1], [1, 0]],
  ['45°: both share the step', { cameraAngleDegrees: 45 }, [root, root], [-root, root]],
  ['0° mirrored', { cameraAngleDegrees: 0, cameraMirrored: true }, [1, 0], [0, -1]],
  ['90° mirrored', { cameraAngleDegrees: 90, cameraMirrored: true }, [0, 1], [1, 0]],
];

describe("errors along the camera's axes", () => {
  it.each(CASES)('become errors along RA and Dec: %s', (_name, map, ra, dec) => {
    const { frames } = readGuideLog(utf8(FILE), { map: along(map) });
    // The sine of 180° in doubles is 1.2e-16, not 0.
    for (const at of [0, 1]) {
      expect(frames.raError[at]).toBeCloseTo(ra[at]!, 14);
      expect(frames.decError[at]).toBeCloseTo(dec[at]!, 14);
    }
  });

  it('keep their length at any angle', () => {
    for (let cameraAngleDegrees = -360; cameraAngleDegrees <= 360; cameraAngleDegrees += 7) {
      const { frames } = readGuideLog(utf8('t,x,y\n0,3,4\n'), {
        map: along({ cameraAngleDegrees }),
      });
      expect(Math.hypot(frames.raError[0]!, frames.decError[0]!)).toBeCloseTo(5, 13);
    }
  });

  const readings: [string, string, ColumnMap, Expected][] = [
    [
      'in guide pixels',
      FILE,
      along({ cameraAngleDegrees: 0 }, 'guide px'),
      { ra: [1, 0], unit: 'guide px' },
    ],
    [
      'with one of them blank: there is no star',
      't,x,y\n0,1,\n1,3,4\n',
      along({ cameraAngleDegrees: 0 }),
      { ra: [NaN, 3], dec: [NaN, 4], refused: [] },
    ],
    [
      'with text in one of them',
      't,x,y\n0,1,far\n1,3,4\n',
      along({ cameraAngleDegrees: 0 }),
      { ra: [3], refused: [[2, 'y error is not a number: "far"']] },
    ],
    [
      'beside errors along RA and Dec, which are read',
      `${HEADER},x,y\n0,1,2,8,9\n`,
      { columns: { x: { role: 'xError', unit: 'arcsec' }, y: { role: 'yError', unit: 'arcsec' } } },
      {
        ra: [1],
        dec: [2],
        warnings: [
          "The errors along RA and Dec are read, those along the camera's axes beside them are not.",
        ],
      },
    ],
  ];
  it.each(readings)('are read %s', (_name, file, map, expected) => {
    expect(seen(readGuideLog(utf8(file), { map }))).toMatchObject(expected);
  });
});

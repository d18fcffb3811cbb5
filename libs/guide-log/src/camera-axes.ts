import { type ColumnMap } from './column-map';

/**
 * Errors along the camera's axes turned into errors along RA and Dec.
 *
 * `cameraAngleDegrees` is the angle θ from the direction of growing x to that of growing RA error, turning towards
 * growing y; growing Dec error lies a quarter turn further on. So RA = x cos θ + y sin θ and Dec = y cos θ - x sin θ: a
 * rotation of the axes (any textbook of analytic geometry). Counted like the rows of a picture, x to the right and y
 * downwards, a picture that is not mirrored has θ = 180° with north up, and 90° with east down. `cameraMirrored` puts
 * growing Dec error a quarter turn back and changes the sign of Dec.
 */
export class CameraAxes {
  readonly #cos: number;
  readonly #sin: number;
  readonly #decSign: 1 | -1;

  constructor({ cameraAngleDegrees = 0, cameraMirrored = false }: ColumnMap) {
    const radians = (cameraAngleDegrees * Math.PI) / 180;
    this.#cos = Math.cos(radians);
    this.#sin = Math.sin(radians);
    this.#decSign = cameraMirrored ? -1 : 1;
  }

  /** Turns the first two values of a row, x and y, into RA and Dec; where one is missing both are. */
  turn(row: Float64Array): void {
    const [x = NaN, y = NaN] = row;
    row[0] = x * this.#cos + y * this.#sin;
    row[1] = this.#decSign * (y * this.#cos - x * this.#sin);
  }
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { FigureKey, type KeyOfNote } from '../figure-key/figure-key';
import { arcsecText, degreesText, ratioText } from '../measure-text';
import { angleFromRaDegrees, type StarShape } from './star-shape';

const SIZE_PX = 240;
const RIM_PX = SIZE_PX / 2 - 22;
const RIM_DEGREES = Array.from({ length: 36 }, (_, i) => i * 10);

/** The star that the camera would record, drawn at its true shape on the camera's own pixels. RA to the right. */
@Component({
  selector: 'app-roundel',
  imports: [FigureKey],
  templateUrl: './roundel.html',
  styleUrl: './roundel.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Roundel {
  readonly star = input.required<StarShape>();
  readonly seeingFwhmArcsec = input.required<number>();
  /** null: no pixel grid is drawn. */
  readonly imagingScaleArcsecPerPx = input.required<number | null>();
  readonly halfWidthArcsec = input.required<number>();
  readonly keys = input<readonly KeyOfNote[]>([]);
  /** For lists: cropped to the rim, without lettering, and as wide as the place it stands in. */
  readonly small = input(false);

  protected readonly sizePx = SIZE_PX;
  protected readonly centrePx = SIZE_PX / 2;
  protected readonly rimPx = RIM_PX;
  protected readonly viewBox = computed(() => {
    const marginPx = this.small() ? SIZE_PX / 2 - RIM_PX - 8 : 0;
    const sidePx = SIZE_PX - 2 * marginPx;
    return `${marginPx} ${marginPx} ${sidePx} ${sidePx}`;
  });
  protected readonly clipId = `roundel-${nextId()}`;
  private readonly pxPerArcsec = computed(() => RIM_PX / this.halfWidthArcsec());

  protected readonly rimTicks = RIM_DEGREES.map((degrees) => {
    const [x, y] = onRim(degrees, RIM_PX);
    const [innerX, innerY] = onRim(degrees, RIM_PX - (degrees % 30 === 0 ? 6 : 3));
    return { x, y, innerX, innerY };
  });

  protected readonly gridPx = computed(() => {
    const scale = this.imagingScaleArcsecPerPx();
    if (scale === null) return [];
    const stepPx = scale * this.pxPerArcsec();
    const each = Math.floor(RIM_PX / stepPx - 0.5);
    // A pixel is centred on the star: its edges lie half a step to either side.
    return Array.from(
      { length: 2 * (each + 1) },
      (_, i) => this.centrePx + (i - each - 0.5) * stepPx,
    ).filter((px) => Math.abs(px - this.centrePx) < RIM_PX);
  });

  protected readonly angleDegrees = computed(() =>
    angleFromRaDegrees(this.star().positionAngleDegrees),
  );
  protected readonly ellipse = computed(() => ({
    longPx: (this.star().fwhmMajorArcsec / 2) * this.pxPerArcsec(),
    shortPx: (this.star().fwhmMinorArcsec / 2) * this.pxPerArcsec(),
    // SVG turns clockwise; RA towards Dec is counter-clockwise on the page.
    rotate: `rotate(${-this.angleDegrees()} ${this.centrePx} ${this.centrePx})`,
  }));
  protected readonly seeingPx = computed(() => (this.seeingFwhmArcsec() / 2) * this.pxPerArcsec());
  protected readonly longAxisTick = computed(() => {
    const [x, y] = onRim(-this.angleDegrees(), RIM_PX + 1);
    const [outerX, outerY] = onRim(-this.angleDegrees(), RIM_PX + 8);
    return { x, y, outerX, outerY };
  });

  /** Beside the rim, upper right. */
  protected readonly placedKeys = computed(() =>
    this.keys().map((key, i) => ({ key, at: { xPx: 212, yPx: 60 + 22 * i } })),
  );

  protected readonly label = computed(() => {
    const star = this.star();
    return (
      `Predicted star ${arcsecText(star.fwhmMajorArcsec)} by ${arcsecText(star.fwhmMinorArcsec)}, ` +
      `aspect ratio ${ratioText(star.aspect)}, long axis ${degreesText(this.angleDegrees())} from RA toward Dec, ` +
      `seeing disc ${arcsecText(this.seeingFwhmArcsec())}.`
    );
  });
}

let lastId = 0;
function nextId(): number {
  lastId += 1;
  return lastId;
}

function onRim(degrees: number, radiusPx: number): [number, number] {
  const angle = (degrees * Math.PI) / 180;
  return [SIZE_PX / 2 + radiusPx * Math.cos(angle), SIZE_PX / 2 + radiusPx * Math.sin(angle)];
}

import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { USUAL_CENTROID_FRACTION_PX, WANTED_ERROR_IMAGING_PX } from '@stillpier/analysis';
import { ratioText } from '../figures/measure-text';

const SIDE_PX = 168;
const EDGE_PX = 2;
/** Beyond it the imaging pixels would be narrower than their lines. */
const MOST_PIXELS = 40;

/** One guide pixel laid over the pixels of the imaging camera, with the error that the guide camera can just see. */
@Component({
  selector: 'app-pixel-figure',
  templateUrl: './pixel-figure.html',
  styleUrl: './pixel-figure.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class PixelFigure {
  /** Guide scale over imaging scale. */
  readonly scaleRatio = input.required<number>();

  protected readonly edge = EDGE_PX;
  protected readonly side = SIDE_PX;
  protected readonly whole = SIDE_PX + 2 * EDGE_PX;
  protected readonly centre = EDGE_PX + SIDE_PX / 2;
  private readonly pixelPx = computed(() => SIDE_PX / this.scaleRatio());
  /** Edges of the imaging pixels, one of them centred on the star. */
  protected readonly lines = computed(() => {
    const ratio = this.scaleRatio();
    if (ratio > MOST_PIXELS) return [];
    const each = Math.floor(ratio / 2 + 0.5);
    return Array.from(
      { length: 2 * each },
      (_, i) => this.centre + (i - each + 0.5) * this.pixelPx(),
    ).filter((px) => px > EDGE_PX && px < EDGE_PX + SIDE_PX);
  });
  protected readonly seenPx = SIDE_PX * USUAL_CENTROID_FRACTION_PX;
  protected readonly wantedPx = computed(() => this.pixelPx() * WANTED_ERROR_IMAGING_PX);
  protected readonly label = computed(
    () =>
      `One guide pixel covers ${ratioText(this.scaleRatio())} imaging pixels each way; the error that the guide camera can just see is ${ratioText(this.scaleRatio() * USUAL_CENTROID_FRACTION_PX)} imaging pixels.`,
  );
}

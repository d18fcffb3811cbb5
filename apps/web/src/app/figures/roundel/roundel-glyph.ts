import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { ratioText } from '../measure-text';
import { angleFromRaDegrees } from './star-shape';

const SIZE_PX = 24;
/** How strongly the glyph shows elongation: a page that uses it says so. */
export const GLYPH_MAGNIFICATION = 3;

/** The star as a sign in a list: elongation drawn three times as strong, size without meaning. */
@Component({
  selector: 'app-roundel-glyph',
  template: `
    <svg role="img" [attr.aria-label]="label()" width="24" height="24" viewBox="0 0 24 24">
      <ellipse
        cx="12"
        cy="12"
        [attr.rx]="radii().long"
        [attr.ry]="radii().short"
        [attr.transform]="radii().rotate"
      />
      <line class="ra" x1="21.4" x2="24" y1="12" y2="12" />
      <line class="ra" x1="0" x2="2.6" y1="12" y2="12" />
      <line class="dec" y1="0" y2="2.6" x1="12" x2="12" />
      <line class="dec" y1="21.4" y2="24" x1="12" x2="12" />
    </svg>
  `,
  styles: `
    :host {
      display: inline-block;
      vertical-align: middle;
      line-height: 0;
    }
    ellipse {
      fill: var(--star);
      stroke: var(--star-edge);
      stroke-width: 1.3;
    }
    .ra {
      stroke: var(--ra);
      stroke-width: 2;
    }
    .dec {
      stroke: var(--dec);
      stroke-width: 2;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RoundelGlyph {
  readonly aspect = input.required<number>();
  readonly positionAngleDegrees = input.required<number>();

  protected readonly radii = computed(() => {
    const drawnAspect = 1 + GLYPH_MAGNIFICATION * (this.aspect() - 1);
    const mean = SIZE_PX * 0.29;
    const half = (SIZE_PX - 8) / 2;
    const long = Math.min(half, mean * Math.sqrt(drawnAspect));
    return {
      long,
      short: long / drawnAspect,
      rotate: `rotate(${-angleFromRaDegrees(this.positionAngleDegrees())} 12 12)`,
    };
  });
  protected readonly label = computed(() => `Star of aspect ratio ${ratioText(this.aspect())}`);
}

import { ChangeDetectionStrategy, Component } from '@angular/core';
import { Roundel } from '../figures/roundel/roundel';

/** What Stillpier is, beside the form that a person without a session came for (projected). */
@Component({
  selector: 'app-front-page',
  imports: [Roundel],
  templateUrl: './front-page.html',
  styleUrl: './front-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FrontPage {
  protected readonly star = {
    fwhmMajorArcsec: 2.61,
    fwhmMinorArcsec: 2.32,
    aspect: 1.13,
    positionAngleDegrees: 80,
  };
}

import { ChangeDetectionStrategy, Component } from '@angular/core';

/** What Stillpier is, beside the form that a person without a session came for (projected). */
@Component({
  selector: 'app-front-page',
  templateUrl: './front-page.html',
  styleUrl: './front-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FrontPage {}

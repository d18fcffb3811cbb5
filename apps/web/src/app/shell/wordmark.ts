import { ChangeDetectionStrategy, Component } from '@angular/core';

/** A pier, the ground it stands on and a star beside it; then the name. */
@Component({
  selector: 'app-wordmark',
  template: `
    <svg width="30" height="30" viewBox="0 0 30 30" aria-hidden="true">
      <circle class="star" cx="22.4" cy="6.6" r="3.5" />
      <path class="pier" d="M9.2 8.4H15L16.4 25H7.8Z" />
      <path class="ground" d="M2 26.4H27" />
    </svg>
    Stillpier
  `,
  styleUrl: './wordmark.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Wordmark {}

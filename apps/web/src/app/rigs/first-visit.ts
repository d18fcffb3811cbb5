import { ChangeDetectionStrategy, Component } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';

/** What the rigs page shows while there is no rig: three steps to the first answer. */
@Component({
  selector: 'app-first-visit',
  imports: [MatButton, RouterLink],
  template: `
    <div class="row">
      <div>
        <p class="folio"><b>Rigs</b><span>first visit</span></p>
        <h1 class="sentence">Three steps, and Stillpier says what your mount did last night.</h1>
      </div>
    </div>
    <section class="plate first row" aria-label="Three steps">
      <div class="main">
        <ol>
          <li>
            <h2>Describe the rig</h2>
            <p>
              The mount, its worm if it has one, and where it stands. What is not known may stay
              empty.
            </p>
          </li>
          <li>
            <h2>Describe the setup</h2>
            <p>Two telescopes and two cameras: with them a guide log can be read in arcseconds.</p>
          </li>
          <li>
            <h2>Add a log</h2>
            <p>
              The CSV file that your guider wrote. A ten-hour night is read and measured within
              seconds, and the original is kept as it is.
            </p>
          </li>
        </ol>
        <p class="actions"><a matButton="filled" routerLink="/rigs/new">Describe the rig</a></p>
      </div>
      <aside class="margin" aria-label="Notes">
        <div class="note">
          <h3>A rig that is shared</h3>
          <p>When somebody shares a rig with you, it stands here by itself.</p>
        </div>
      </aside>
    </section>
  `,
  styleUrl: './first-visit.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FirstVisit {}

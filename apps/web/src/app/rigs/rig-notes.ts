import { ChangeDetectionStrategy, Component } from '@angular/core';

/** The margin beside the rig's form: what each entry is good for. */
@Component({
  selector: 'app-rig-notes',
  template: `
    <div class="note">
      <h3>The worm</h3>
      <p>
        With its teeth or its period the analysis tells periodic error from everything else, and
        folds the night on the turn of the worm.
      </p>
      <p>
        A mount without a worm repeats too: enter its wave generator or its roller as a gear stage.
      </p>
    </div>
    <div class="note">
      <h3>The guide rate</h3>
      <p>With it corrections in milliseconds become arcseconds, and backlash can be sized.</p>
    </div>
    <div class="note">
      <h3>The site</h3>
      <p>
        Latitude and longitude give the height of the target and the share of drift that refraction
        makes. A tenth of a degree will do.
      </p>
    </div>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'margin', role: 'complementary', 'aria-label': 'Notes on the rig' },
})
export class RigNotes {}

import { ChangeDetectionStrategy, Component, computed, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { RigStatesApi } from '../api/rig-states-api';
import { RigsApi } from '../api/rigs-api';
import { countedText } from '../figures/measure-text';
import { roundelHalfWidthArcsec } from '../figures/roundel/star-shape';
import { Emphasis } from '../page/emphasis';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { FirstVisit } from './first-visit';
import { RigEntry } from './rig-entry';
import { rigsSentence } from './rigs-sentence';

/** One line a rig: last night's star, its state in a sentence, the trend. */
@Component({
  selector: 'app-rigs-page',
  imports: [Emphasis, Failure, FirstVisit, MatButton, RigEntry, RouterLink, Waiting],
  templateUrl: './rigs-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled' },
})
export class RigsPage {
  protected readonly rigs = inject(RigsApi).list;
  protected readonly states = inject(RigStatesApi).list();

  protected readonly error = computed(() => this.rigs.error() ?? this.states.error());
  protected readonly view = computed(() => {
    if (!this.rigs.hasValue() || !this.states.hasValue()) return null;
    const rigs = this.rigs.value();
    const states = this.states.value();
    const nightCount = states.reduce((sum, state) => sum + state.nightCount, 0);
    const stars = states.flatMap(({ footprint }) => footprint ?? []);
    return {
      entries: rigs.map((rig) => ({ rig, state: states.find(({ rigId }) => rigId === rig.id) })),
      sentence: rigsSentence(rigs, states),
      rigCount: countedText(rigs.length, 'rig', 'rigs'),
      nightCount: countedText(nightCount, 'night', 'nights'),
      halfWidthArcsec: roundelHalfWidthArcsec(stars),
    };
  });

  protected retry(): void {
    this.rigs.reload();
    this.states.reload();
  }
}

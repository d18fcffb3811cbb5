import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  viewChild,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { Router, RouterLink } from '@angular/router';
import { exportPaths, type Rig } from '@stillpier/contract';
import { sentenceOf } from '../api/problem-error';
import { RigsApi } from '../api/rigs-api';
import { type HoldsEdits } from '../form/keep-edits-guard';
import { Questions } from '../form/questions';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { ColumnMapList } from './column-map-list';
import { RigForm } from './rig-form';
import { RigNotes } from './rig-notes';
import { SetupList } from './setup-list';

/** Mount, site, setups and column maps of a rig, and its end. */
@Component({
  selector: 'app-rig-settings-page',
  imports: [ColumnMapList, Failure, MatButton, RigForm, RigNotes, RouterLink, SetupList, Waiting],
  templateUrl: './rig-settings-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled', '(window:beforeunload)': 'warn($event)' },
})
export class RigSettingsPage implements HoldsEdits {
  private readonly rigsApi = inject(RigsApi);
  private readonly router = inject(Router);
  private readonly questions = inject(Questions);
  private readonly snackBar = inject(MatSnackBar);
  private readonly rigForm = viewChild(RigForm);

  readonly rigId = input.required<string>();

  protected readonly loaded = this.rigsApi.one(this.rigId);
  /** As loaded, or as last saved here. */
  protected readonly rig = linkedSignal(() =>
    this.loaded.hasValue() ? this.loaded.value() : undefined,
  );
  protected readonly archive = computed(() => exportPaths.rig(this.rigId()));
  protected readonly mayEdit = computed(() => this.rig()?.role !== 'advisor');

  hasUnsavedEdits(): boolean {
    return this.rigForm()?.form.dirty === true;
  }

  protected warn(event: Event): void {
    if (this.hasUnsavedEdits()) event.preventDefault();
  }

  protected show(rig: Rig): void {
    this.rig.set(rig);
    this.snackBar.open('The rig is saved.');
  }

  /** Asked for twice: everything that hangs on the rig goes with it. */
  protected async remove(rig: Rig): Promise<void> {
    const first = await this.questions.ask({
      title: `Delete ${rig.name}?`,
      text: 'Its setups, column maps, nights, notes and the original log files go with it, for everybody who sees the rig.',
      yes: 'Go on to delete',
      no: 'Keep the rig',
    });
    if (!first) return;
    const second = await this.questions.ask({
      title: `Delete ${rig.name} for good?`,
      text: 'This cannot be taken back. Download the original logs first if they are kept nowhere else.',
      yes: `Delete ${rig.name} for good`,
      no: 'Keep the rig',
    });
    if (!second) return;
    try {
      await this.rigsApi.remove(rig.id);
    } catch (error) {
      // Nothing on the page shows this: the rig is still there.
      this.snackBar.open(`The rig is not deleted. ${sentenceOf(error)}`, 'Close');
      return;
    }
    this.rigForm()?.form.markAsPristine();
    await this.router.navigate(['/rigs']);
    this.snackBar.open(`${rig.name} is deleted.`);
  }
}

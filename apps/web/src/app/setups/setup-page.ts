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
import { Router } from '@angular/router';
import { type Setup } from '@stillpier/contract';
import { sentenceOf } from '../api/problem-error';
import { RigsApi } from '../api/rigs-api';
import { SetupsApi } from '../api/setups-api';
import { type HoldsEdits } from '../form/keep-edits-guard';
import { Questions } from '../form/questions';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { SetupForm } from './setup-form';

/** One setup of a rig: a new one, or one that is there. */
@Component({
  selector: 'app-setup-page',
  imports: [Failure, MatButton, SetupForm, Waiting],
  templateUrl: './setup-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled', '(window:beforeunload)': 'warn($event)' },
})
export class SetupPage implements HoldsEdits {
  private readonly setupsApi = inject(SetupsApi);
  private readonly router = inject(Router);
  private readonly questions = inject(Questions);
  private readonly snackBar = inject(MatSnackBar);
  private readonly setupForm = viewChild(SetupForm);

  readonly rigId = input.required<string>();
  /** Missing for a new setup. */
  readonly setupId = input<string>();

  protected readonly rig = inject(RigsApi).one(this.rigId);
  protected readonly loaded = this.setupsApi.one(this.rigId, this.setupId);
  /** As loaded, or as last saved here; null for a new one. */
  protected readonly setup = linkedSignal(() => {
    if (this.setupId() === undefined) return null;
    return this.loaded.hasValue() ? this.loaded.value() : undefined;
  });
  protected readonly failed = computed(() => this.rig.error() ?? this.loaded.error());

  hasUnsavedEdits(): boolean {
    return this.setupForm()?.form.dirty === true;
  }

  protected warn(event: Event): void {
    if (this.hasUnsavedEdits()) event.preventDefault();
  }

  protected retry(): void {
    this.rig.reload();
    this.loaded.reload();
  }

  protected async show(setup: Setup): Promise<void> {
    this.snackBar.open('The setup is saved.');
    if (this.setupId() === undefined) await this.leave();
    else this.setup.set(setup);
  }

  protected async remove(setup: Setup): Promise<void> {
    const sure = await this.questions.ask({
      title: `Delete the setup ${setup.name}?`,
      text: 'Nights that were read with it stay as they are.',
      yes: 'Delete the setup',
      no: 'Keep it',
    });
    if (!sure) return;
    try {
      await this.setupsApi.remove(setup);
    } catch (error) {
      // Nothing on the page shows this: the setup is still there.
      this.snackBar.open(`The setup is not deleted. ${sentenceOf(error)}`, 'Close');
      return;
    }
    this.setupForm()?.form.markAsPristine();
    this.snackBar.open(`The setup ${setup.name} is deleted.`);
    await this.leave();
  }

  private async leave(): Promise<void> {
    await this.router.navigate(['/rigs', this.rigId(), 'settings']);
  }
}

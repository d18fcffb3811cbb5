import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  output,
} from '@angular/core';
import { toSignal } from '@angular/core/rxjs-interop';
import { ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { createSetupSchema, type Setup } from '@stillpier/contract';
import { map } from 'rxjs';
import { SetupsApi } from '../api/setups-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { Emphasis } from '../page/emphasis';
import { OpticsFields } from './optics-fields';
import { OpticsNotes } from './optics-notes';
import { opticsReadings } from './optics-readings';
import { PixelFigure } from './pixel-figure';
import { filterGroup, setupFormGroup, showSetup, USUAL_FILTERS } from './setup-form-group';

/** Optics, cameras and filters of a setup, with what follows from them in the margin while typing. */
@Component({
  selector: 'app-setup-form',
  imports: [
    Emphasis,
    Field,
    FieldInput,
    FormMessage,
    MatButton,
    OpticsFields,
    OpticsNotes,
    PixelFigure,
    ReactiveFormsModule,
  ],
  templateUrl: './setup-form.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetupForm {
  private readonly setupsApi = inject(SetupsApi);

  readonly rigId = input.required<string>();
  readonly rigName = input.required<string>();
  /** null for a new setup. */
  readonly setup = input.required<Setup | null>();
  readonly mayEdit = input.required<boolean>();
  readonly saved = output<Setup>();
  /** Somebody else saved the setup meanwhile, and the person wants to see that version. */
  readonly reload = output();

  readonly form = setupFormGroup();
  protected readonly submission = new FormSubmission();
  protected readonly usualFilters = USUAL_FILTERS;
  private readonly entry = toSignal(
    this.form.valueChanges.pipe(map(() => this.form.getRawValue())),
    { initialValue: this.form.getRawValue() },
  );
  protected readonly readings = computed(() => opticsReadings(this.entry()));

  constructor() {
    effect(() => {
      const setup = this.setup();
      if (setup !== null) showSetup(this.form, setup);
      if (!this.mayEdit()) this.form.disable();
      this.submission.clear();
    });
  }

  protected addFilters(filters: readonly { name: string; subSeconds: number | null }[]): void {
    filters.forEach((filter) => {
      this.form.controls.filters.push(filterGroup(filter));
    });
    this.form.markAsDirty();
  }

  protected removeFilter(index: number): void {
    this.form.controls.filters.removeAt(index);
    this.form.markAsDirty();
  }

  protected async save(): Promise<void> {
    await this.submission.send(this.form, createSetupSchema, async (body) => {
      const known = this.setup();
      const setup = known
        ? await this.setupsApi.update(known, body)
        : await this.setupsApi.create(this.rigId(), body);
      this.form.markAsPristine();
      this.saved.emit(setup);
    });
  }
}

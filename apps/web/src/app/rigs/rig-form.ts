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
import { wormPeriodSeconds } from '@stillpier/analysis';
import { createRigSchema, type Rig } from '@stillpier/contract';
import { RigsApi } from '../api/rigs-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { MOUNT_KIND_NAMES } from './mount-kinds';
import { gearStageGroup, rigFormGroup, showRig } from './rig-form-group';
import { TimeZoneField } from './time-zone-field';

/** Mount and site of a rig: a new one, or one that is changed. */
@Component({
  selector: 'app-rig-form',
  imports: [Field, FieldInput, FormMessage, MatButton, ReactiveFormsModule, TimeZoneField],
  templateUrl: './rig-form.html',
  styles: ':host { display: block; }',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RigForm {
  private readonly rigsApi = inject(RigsApi);

  /** null for a new rig. */
  readonly rig = input.required<Rig | null>();
  readonly saved = output<Rig>();
  /** Somebody else saved the rig meanwhile, and the person wants to see that version. */
  readonly reload = output();

  readonly form = rigFormGroup();
  protected readonly submission = new FormSubmission();
  protected readonly mountKinds = MOUNT_KIND_NAMES;
  protected readonly mount = this.form.controls.mount.controls;
  protected readonly site = this.form.controls.site.controls;
  private readonly values = toSignal(this.form.valueChanges, { initialValue: this.form.value });
  protected readonly isWorm = computed(() => this.values().mount?.kind === 'worm');
  protected readonly wormNote = computed(() => {
    const teeth = this.values().mount?.wormTeeth ?? 0;
    return teeth > 0
      ? `${teeth} teeth: one turn of the worm takes ${wormPeriodSeconds(teeth).toFixed(1)} s.`
      : 'Teeth of the RA wheel; one turn of the worm takes a sidereal day over their count.';
  });

  constructor() {
    effect(() => {
      const rig = this.rig();
      if (rig === null) return;
      showRig(this.form, rig);
      if (rig.role === 'advisor') this.form.disable();
      this.submission.clear();
    });
  }

  protected forgetWorm(): void {
    if (this.mount.kind.value !== 'worm') {
      this.form.controls.mount.patchValue({ wormTeeth: null, wormPeriodSeconds: null });
    }
  }

  protected addStage(): void {
    this.mount.gearStages.push(gearStageGroup({ name: '', periodSeconds: null }));
    this.form.markAsDirty();
  }

  protected removeStage(index: number): void {
    this.mount.gearStages.removeAt(index);
    this.form.markAsDirty();
  }

  protected async save(): Promise<void> {
    await this.submission.send(this.form, createRigSchema, async (body) => {
      const known = this.rig();
      const rig = known
        ? await this.rigsApi.update(known.id, known.version, body)
        : await this.rigsApi.create(body);
      this.form.markAsPristine();
      this.saved.emit(rig);
    });
  }
}

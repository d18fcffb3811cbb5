import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
} from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { createColumnMapSchema, type OwnColumnMap } from '@stillpier/contract';
import * as z from 'zod';
import { ColumnMapsApi } from '../api/column-maps-api';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import type { Intake } from './intake';

const formSchema = createColumnMapSchema.pick({ name: true }).extend({ forAllRigs: z.boolean() });

/** Keeps what was chosen for the columns, so that the next file of this kind needs no question. */
@Component({
  selector: 'app-map-saver',
  imports: [Field, FieldInput, FormMessage, MatButton, ReactiveFormsModule],
  templateUrl: './map-saver.html',
  styles: `
    h3 {
      font: 620 15.5px/22px var(--text);
    }
    .check {
      margin-top: 12px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MapSaver {
  private readonly columnMapsApi = inject(ColumnMapsApi);

  readonly rigId = input.required<string>();
  readonly rigName = input.required<string>();
  readonly intake = input.required<Intake>();
  readonly saved = output<OwnColumnMap>();

  protected readonly submission = new FormSubmission();
  /** Of the map that was saved; another header line has its own. */
  protected readonly name = linkedSignal<string, string | null>({
    source: computed(() => JSON.stringify(this.intake().headerCells)),
    computation: () => null,
  });
  protected readonly form = new FormGroup({
    name: new FormControl('', { nonNullable: true }),
    forAllRigs: new FormControl(false, { nonNullable: true }),
  });

  protected async save(): Promise<void> {
    const { headerCells, map } = this.intake();
    await this.submission.send(this.form, formSchema, async ({ name, forAllRigs }) => {
      const saved = await this.columnMapsApi.create(forAllRigs ? null : this.rigId(), {
        name,
        headerCells: [...headerCells],
        map: map ?? {},
      });
      this.name.set(saved.name);
      this.saved.emit(saved);
    });
  }
}

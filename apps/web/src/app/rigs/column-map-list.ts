import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { FormControl, FormGroup, ReactiveFormsModule } from '@angular/forms';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { createColumnMapSchema, type OwnColumnMap } from '@stillpier/contract';
import { ColumnMapsApi, type MapOwner } from '../api/column-maps-api';
import { sentenceOf } from '../api/problem-error';
import { Field } from '../form/field';
import { FieldInput } from '../form/field-input';
import { FormMessage } from '../form/form-message';
import { FormSubmission } from '../form/form-submission';
import { Questions } from '../form/questions';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { ColumnMapFile } from './column-map-file';

const renameSchema = createColumnMapSchema.pick({ name: true });

/** How kinds of log are read, of a rig or of the person: saved while adding logs, or taken in as files. */
@Component({
  selector: 'app-column-map-list',
  imports: [
    ColumnMapFile,
    Failure,
    Field,
    FieldInput,
    FormMessage,
    MatButton,
    ReactiveFormsModule,
    Waiting,
  ],
  templateUrl: './column-map-list.html',
  styleUrl: './column-map-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ColumnMapList {
  private readonly columnMapsApi = inject(ColumnMapsApi);
  private readonly questions = inject(Questions);
  private readonly snackBar = inject(MatSnackBar);

  readonly owner = input.required<MapOwner>();
  readonly title = input.required<string>();
  readonly mayEdit = input.required<boolean>();

  protected readonly maps = this.columnMapsApi.list(this.owner);
  protected readonly rows = computed(() =>
    (this.maps.hasValue() ? this.maps.value() : []).map((map) => ({
      map,
      roles: rolesOf(map),
      header: headerOf(map),
      file: this.columnMapsApi.fileAddress(this.owner(), map),
    })),
  );

  protected readonly renaming = signal<OwnColumnMap | null>(null);
  protected readonly submission = new FormSubmission();
  protected readonly form = new FormGroup({ name: new FormControl('', { nonNullable: true }) });

  protected startRename(map: OwnColumnMap): void {
    this.form.setValue({ name: map.name });
    this.submission.clear();
    this.renaming.set(map);
  }

  protected async rename(map: OwnColumnMap): Promise<void> {
    const accepted = await this.submission.send(this.form, renameSchema, ({ name }) =>
      this.columnMapsApi.rename(this.owner(), map, name),
    );
    if (accepted) this.renaming.set(null);
    this.maps.reload();
  }

  protected async remove(map: OwnColumnMap): Promise<void> {
    const sure = await this.questions.ask({
      title: `Delete the column map ${map.name}?`,
      text: 'Nights that were read with it stay as they are. The next log of that kind asks again what its columns mean.',
      yes: 'Delete the map',
      no: 'Keep it',
    });
    if (!sure) return;
    try {
      await this.columnMapsApi.remove(this.owner(), map);
    } catch (error) {
      // Nothing on the page shows this: the map is still in the list.
      this.snackBar.open(`The map is not deleted. ${sentenceOf(error)}`, 'Close');
    }
    this.maps.reload();
  }
}

function rolesOf({ map }: OwnColumnMap): string {
  const roles = Object.values(map.columns ?? {}).map(({ role }) => role);
  return `${roles.filter((role) => role !== 'ignore').length} of ${roles.length} columns used`;
}

function headerOf({ headerCells }: OwnColumnMap): string {
  if (headerCells === null) return 'every header with the columns that it names';
  return headerCells.join(', ') || 'files without a header';
}

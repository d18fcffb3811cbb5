import { ChangeDetectionStrategy, Component, inject, input } from '@angular/core';
import { MatSnackBar } from '@angular/material/snack-bar';
import { type OwnColumnMap } from '@stillpier/contract';
import { ColumnMapsApi } from '../api/column-maps-api';
import { sentenceOf } from '../api/problem-error';
import { Questions } from '../form/questions';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';

/** How the rig's kinds of log are read, as saved while adding logs. */
@Component({
  selector: 'app-column-map-list',
  imports: [Failure, Waiting],
  templateUrl: './column-map-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ColumnMapList {
  private readonly columnMapsApi = inject(ColumnMapsApi);
  private readonly questions = inject(Questions);
  private readonly snackBar = inject(MatSnackBar);

  readonly rigId = input.required<string>();
  readonly mayEdit = input.required<boolean>();

  protected readonly maps = this.columnMapsApi.list(this.rigId);

  protected rolesOf({ map }: OwnColumnMap): string {
    const roles = Object.values(map.columns ?? {}).map(({ role }) => role);
    return `${roles.filter((role) => role !== 'ignore').length} of ${roles.length} columns used`;
  }

  protected headerOf({ headerCells }: OwnColumnMap): string {
    if (headerCells === null) return 'every header with the columns that it names';
    return headerCells.join(', ') || 'files without a header';
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
      await this.columnMapsApi.remove(this.rigId(), map);
    } catch (error) {
      // Nothing on the page shows this: the map is still in the list.
      this.snackBar.open(`The map is not deleted. ${sentenceOf(error)}`, 'Close');
    }
    this.maps.reload();
  }
}

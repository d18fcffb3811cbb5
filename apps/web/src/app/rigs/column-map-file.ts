import { ChangeDetectionStrategy, Component, inject, input, output, signal } from '@angular/core';
import { columnMapSchema, createColumnMapSchema } from '@stillpier/contract';
import { ColumnMapsApi, type MapOwner } from '../api/column-maps-api';
import { sentenceOf } from '../api/problem-error';

/** Takes in a column map that was kept as a file, as MAP.json. */
@Component({
  selector: 'app-column-map-file',
  template: `
    <p>
      <label class="choose">
        Take in a map from a file
        <input
          class="cdk-visually-hidden"
          type="file"
          accept=".json,application/json"
          (change)="take($event)"
        />
      </label>
    </p>
    <p class="small q">MAP.json, as it is saved here or used by the command line.</p>
    <div role="alert">
      @if (fault(); as text) {
        <p class="refusal">{{ text }}</p>
      }
    </div>
  `,
  styles: `
    :host {
      display: block;
      margin-top: 16px;
    }
    .choose {
      display: inline-block;
      padding-block: 10px;
      text-decoration: underline;
      text-decoration-color: var(--mark);
      text-underline-offset: 3px;
      cursor: pointer;
    }
    .choose:focus-within {
      outline: 2px solid var(--focus);
      outline-offset: 2px;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ColumnMapFile {
  private readonly columnMapsApi = inject(ColumnMapsApi);

  readonly owner = input.required<MapOwner>();
  readonly taken = output();

  protected readonly fault = signal<string | null>(null);

  protected async take(event: Event): Promise<void> {
    if (!(event.target instanceof HTMLInputElement)) return;
    const file = event.target.files?.[0];
    event.target.value = ''; // the same file may be chosen again
    if (!file) return;
    const read = columnMapSchema.safeParse(jsonOf(await file.text()));
    if (!read.success) {
      const [issue] = read.error.issues;
      const where = issue?.path.join('.');
      this.fault.set(
        `${file.name} is no column map${where ? `: ${where} ${issue?.message}` : ''}.`,
      );
      return;
    }
    this.fault.set(null);
    try {
      await this.columnMapsApi.createFromFile(this.owner(), nameOf(file), read.data);
      this.taken.emit();
    } catch (error) {
      this.fault.set(`${file.name} is not taken in. ${sentenceOf(error)}`);
    }
  }
}

/** The map goes by the name of its file; it can be renamed. */
function nameOf({ name }: File): string {
  const bare = name.replace(/\.json$/i, '').slice(0, 80);
  return createColumnMapSchema.shape.name.safeParse(bare).success ? bare : 'Column map';
}

/** undefined for text that is no JSON: the schema refuses it. */
function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined; // JSON.parse has no other way to say so
  }
}

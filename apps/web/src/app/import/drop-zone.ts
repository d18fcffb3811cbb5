import {
  ChangeDetectionStrategy,
  Component,
  type ElementRef,
  output,
  signal,
  viewChild,
} from '@angular/core';

/** Where files are dropped or chosen. */
@Component({
  selector: 'app-drop-zone',
  template: `
    <div
      class="drop"
      [class.over]="over()"
      (dragover)="allow($event)"
      (dragleave)="over.set(false)"
      (drop)="take($event)"
    >
      <p>
        Drop guide logs here, or
        <label class="choose">
          choose files
          <input
            #picker
            class="cdk-visually-hidden"
            type="file"
            multiple
            accept=".csv,.txt,.log,.tsv,.gz,text/csv,text/plain,application/gzip"
            (change)="choose()"
          />
        </label>
      </p>
      <p class="kinds">CSV or other text with a column for each value, also packed by gzip</p>
    </div>
  `,
  styleUrl: './drop-zone.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class DropZone {
  readonly files = output<File[]>();

  private readonly picker = viewChild.required<ElementRef<HTMLInputElement>>('picker');
  protected readonly over = signal(false);

  protected allow(event: DragEvent): void {
    event.preventDefault(); // else the browser opens the file
    this.over.set(true);
  }

  protected take(event: DragEvent): void {
    event.preventDefault();
    this.over.set(false);
    this.emit(event.dataTransfer?.files);
  }

  protected choose(): void {
    const input = this.picker().nativeElement;
    this.emit(input.files);
    input.value = ''; // the same file may be chosen again
  }

  private emit(files: FileList | null | undefined): void {
    const picked = [...(files ?? [])];
    if (picked.length > 0) this.files.emit(picked);
  }
}

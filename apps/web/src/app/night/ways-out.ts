import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { exportPaths, importPaths } from '@stillpier/contract';

/** What can be taken along of one log. */
@Component({
  selector: 'app-ways-out',
  template: `
    <a [href]="paths().original" download>Original file</a>
    <a [href]="paths().frames" download>Frames (CSV)</a>
    <a [href]="paths().document" download>Document (JSON)</a>
  `,
  styles: `
    :host {
      display: flex;
      flex-wrap: wrap;
      gap: 2px 16px;
      font-size: 14px;
    }
    @media (max-width: 700px) {
      a {
        padding-block: 12px;
      }
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WaysOut {
  readonly rigId = input.required<string>();
  readonly importId = input.required<string>();

  protected readonly paths = computed(() => ({
    original: importPaths.original(this.rigId(), this.importId()),
    frames: exportPaths.frames(this.rigId(), this.importId()),
    document: importPaths.document(this.rigId(), this.importId()),
  }));
}

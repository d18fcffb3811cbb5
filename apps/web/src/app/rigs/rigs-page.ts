import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { RigsApi } from '../api/rigs-api';

@Component({
  selector: 'app-rigs-page',
  templateUrl: './rigs-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled' },
})
export class RigsPage {
  protected readonly rigs = inject(RigsApi).list;
}

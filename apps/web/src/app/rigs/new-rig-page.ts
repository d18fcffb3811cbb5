import { ChangeDetectionStrategy, Component, inject, viewChild } from '@angular/core';
import { Router } from '@angular/router';
import { type Rig } from '@stillpier/contract';
import { type HoldsEdits } from '../form/keep-edits-guard';
import { RigForm } from './rig-form';
import { RigNotes } from './rig-notes';

@Component({
  selector: 'app-new-rig-page',
  imports: [RigForm, RigNotes],
  template: `
    <div class="row">
      <div>
        <p class="folio"><b>New rig</b></p>
        <h1 class="sentence">A rig is a mount at a site. What is not known may stay empty.</h1>
      </div>
    </div>
    <section class="plate first row">
      <div class="main">
        <div class="plate-head"><h2>Mount and site</h2></div>
        <app-rig-form [rig]="null" (saved)="describeSetup($event)" />
      </div>
      <app-rig-notes />
    </section>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled', '(window:beforeunload)': 'warn($event)' },
})
export class NewRigPage implements HoldsEdits {
  private readonly router = inject(Router);
  private readonly rigForm = viewChild.required(RigForm);

  hasUnsavedEdits(): boolean {
    return this.rigForm().form.dirty;
  }

  protected warn(event: Event): void {
    if (this.hasUnsavedEdits()) event.preventDefault();
  }

  protected async describeSetup(rig: Rig): Promise<void> {
    await this.router.navigate(['/rigs', rig.id, 'setups', 'new']);
  }
}

import { ChangeDetectionStrategy, Component, inject } from '@angular/core';
import { MatButton } from '@angular/material/button';
import {
  MAT_DIALOG_DATA,
  MatDialogActions,
  MatDialogClose,
  MatDialogContent,
  MatDialogTitle,
} from '@angular/material/dialog';

export interface Question {
  readonly title: string;
  readonly text: string;
  /** What the two buttons do, as "Delete the setup" and "Keep it". */
  readonly yes: string;
  readonly no: string;
}

@Component({
  selector: 'app-question-dialog',
  imports: [MatButton, MatDialogActions, MatDialogClose, MatDialogContent, MatDialogTitle],
  template: `
    <h2 matDialogTitle>{{ question.title }}</h2>
    <mat-dialog-content>{{ question.text }}</mat-dialog-content>
    <mat-dialog-actions>
      <button matButton="outlined" type="button" [matDialogClose]="false">{{ question.no }}</button>
      <button matButton="filled" type="button" [matDialogClose]="true">{{ question.yes }}</button>
    </mat-dialog-actions>
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class QuestionDialog {
  protected readonly question = inject<Question>(MAT_DIALOG_DATA);
}

import { inject, Injectable } from '@angular/core';
import { MatDialog, MatDialogConfig } from '@angular/material/dialog';
import { firstValueFrom } from 'rxjs';
import { type Question, QuestionDialog } from './question-dialog';

/** Asks a yes-or-no question in a dialog. */
@Injectable({ providedIn: 'root' })
export class Questions {
  private readonly dialog = inject(MatDialog);

  /** @returns Whether the answer was yes; closing the dialog is a no. */
  async ask(question: Question): Promise<boolean> {
    const config = new MatDialogConfig<Question>();
    config.data = question;
    config.maxWidth = '520px';
    const dialog = this.dialog.open<QuestionDialog, Question, boolean>(QuestionDialog, config);
    return (await firstValueFrom(dialog.afterClosed())) === true;
  }
}

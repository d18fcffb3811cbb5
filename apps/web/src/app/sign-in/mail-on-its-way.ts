import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { type MailSent } from '@stillpier/contract';

/** What the server said once a mail was sent, and where to read it when it never leaves this machine. */
@Component({
  selector: 'app-mail-on-its-way',
  template: `
    <p>{{ sent().message }}</p>
    @if (sent().localMailUrl; as url) {
      <p>
        This installation keeps its e-mails at <a [href]="url">{{ url }}</a>.
      </p>
    }
  `,
  styles: `
    :host {
      display: contents;
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MailOnItsWay {
  readonly sent = input.required<MailSent>();
}

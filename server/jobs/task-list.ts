import type { TaskList } from 'graphile-worker';
import { READ_LOG_TASK } from '../imports/start-reading';
import { SEND_MAIL_TASK } from '../mail/mail-queue';
import { type MailParts, sendMailTask } from '../mail/send-mail-task';
import { readLogTask } from './read-log-task';

export interface TaskParts {
  readonly mail: MailParts;
  readonly log: (message: string, error?: unknown) => void;
}

/** Everything that the queue can be asked to do. */
export function taskList({ mail, log }: TaskParts): TaskList {
  return {
    [READ_LOG_TASK]: readLogTask(mail.knex, log),
    [SEND_MAIL_TASK]: sendMailTask(mail),
  };
}

import type { TaskList } from 'graphile-worker';
import { READ_LOG_TASK } from '../imports/start-reading';
import { SEND_MAIL_TASK } from '../mail/mail-queue';
import { type MailParts, sendMailTask } from '../mail/send-mail-task';
import { readLogTask } from './read-log-task';
import type { ReadingLimits } from './reading-limits';

export interface TaskParts {
  readonly mail: MailParts;
  readonly limits: ReadingLimits;
  readonly log: (message: string, error?: unknown) => void;
}

/** Everything that the queue can be asked to do. */
export function taskList({ mail, limits, log }: TaskParts): TaskList {
  return {
    [READ_LOG_TASK]: readLogTask({ knex: mail.knex, limits, log }),
    [SEND_MAIL_TASK]: sendMailTask(mail),
  };
}

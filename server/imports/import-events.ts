import { importEventSchema } from '@stillpier/contract';
import type { Response } from 'express';
import type { Logger } from 'pino';
import type { NotifyHub } from '../database/notify-hub';
import type { EventStreams } from '../http/event-streams';
import { importNoticeSchema } from './import-notices';
import type { ImportService } from './import-service';

/** Tells a page what becomes of a rig's imports: first as they stand, then each change. */
export class ImportEvents {
  constructor(
    private readonly imports: ImportService,
    private readonly hub: NotifyHub,
    private readonly streams: EventStreams,
    private readonly logger: Logger,
  ) {}

  async follow(accountId: string, rigId: string, res: Response): Promise<void> {
    await this.imports.recent(accountId, rigId); // a stranger gets an answer and no stream
    const changed = new Set<string>();
    let isAll = true;
    let isSending = false;

    // One round at a time, so that an older state never follows a newer one. Each round asks for the right anew.
    const sendChanges = async (): Promise<void> => {
      if (isSending) return;
      isSending = true;
      try {
        while (isAll || changed.size > 0) {
          const ids = isAll ? null : [...changed];
          isAll = false;
          changed.clear();
          const imports = await (ids
            ? this.imports.some(accountId, rigId, ids)
            : this.imports.recent(accountId, rigId));
          for (const each of imports) stream.send('import', importEventSchema.parse(each));
        }
      } catch (error) {
        this.logger.info({ err: error }, 'an event stream ended');
        stream.end();
      } finally {
        isSending = false;
      }
    };
    const onMessage = (message: unknown): void => {
      const notice = importNoticeSchema.parse(message);
      if (notice.rigId !== rigId) return;
      changed.add(notice.importId);
      void sendChanges();
    };
    const onReset = (): void => {
      isAll = true;
      void sendChanges();
    };
    const stream = this.streams.open(res, () => {
      this.hub.off('message', onMessage);
      this.hub.off('reset', onReset);
    });
    this.hub.on('message', onMessage); // before the first look: nothing is lost in between
    this.hub.on('reset', onReset);
    await sendChanges();
  }
}

import { EventEmitter } from 'node:events';
import { setTimeout as sleep } from 'node:timers/promises';
import pg from 'pg';

interface HubEvents {
  message: [payload: unknown];
  /** The connection was lost and is back: what was said in between is not known. */
  reset: [];
}

/** The one LISTEN connection of a process; it comes back by itself. */
export class NotifyHub extends EventEmitter<HubEvents> {
  #client: pg.Client | undefined;
  #stopped = false;

  constructor(
    private readonly databaseUrl: string,
    private readonly channel: string,
  ) {
    super();
    this.setMaxListeners(0); // one listener an open event stream
  }

  async start(): Promise<void> {
    const client = new pg.Client({
      connectionString: this.databaseUrl,
      keepAlive: true,
      application_name: 'stillpier-notify',
    });
    client.on('error', () => undefined); // 'end' follows; without a handler the process dies
    client.on('end', () => {
      if (!this.#stopped && this.#client === client) void this.#reconnect();
    });
    client.on('notification', ({ payload }) => {
      this.emit('message', JSON.parse(payload ?? 'null'));
    });
    await client.connect();
    this.#client = client;
    await client.query(`LISTEN ${client.escapeIdentifier(this.channel)}`);
  }

  async stop(): Promise<void> {
    this.#stopped = true;
    await this.#client?.end();
  }

  async #reconnect(): Promise<void> {
    for (let delayMs = 200; !this.#stopped; delayMs = Math.min(delayMs * 2, 5000)) {
      await sleep(delayMs);
      try {
        await this.start();
        this.emit('reset');
        return;
      } catch {
        continue; // the database is still away: the next try comes later
      }
    }
  }
}

import type { Response } from 'express';

const HEARTBEAT_MS = 15_000;

export interface EventStream {
  readonly send: (event: string, data: unknown) => void;
  readonly end: () => void;
}

/** All Server-Sent Event streams of a process: an open one would hold the server's close for ever. */
export class EventStreams {
  readonly #open = new Set<EventStream>();

  /** Starts a stream; `onEnd` is called once, whoever ends it. */
  open(res: Response, onEnd: () => void): EventStream {
    res.set({
      'Content-Type': 'text/event-stream',
      // no-transform: a compressed stream would be held back until its buffer is full
      'Cache-Control': 'no-cache, no-transform',
      'X-Accel-Buffering': 'no',
    });
    res.flushHeaders();
    const heartbeat = setInterval(() => res.write(': still here\n\n'), HEARTBEAT_MS);
    const stream: EventStream = {
      send: (event, data) => {
        if (!res.writableEnded) res.write(`event: ${event}\ndata: ${JSON.stringify(data)}\n\n`);
      },
      end: () => {
        if (!this.#open.delete(stream)) return;
        clearInterval(heartbeat);
        onEnd();
        res.end();
      },
    };
    this.#open.add(stream);
    res.on('close', stream.end);
    return stream;
  }

  closeAll(): void {
    for (const stream of [...this.#open]) stream.end();
  }
}

import { vi } from 'vitest';

/** The browser's event stream, faked: `tell` is the server speaking. */
export class FakeEventSource {
  static last: FakeEventSource;
  private listener: ((event: MessageEvent<string>) => void) | undefined;
  readonly close = vi.fn();
  constructor(readonly url: string) {
    FakeEventSource.last = this;
  }
  addEventListener(_type: string, listener: (event: MessageEvent<string>) => void) {
    this.listener = listener;
  }
  tell(event: object) {
    this.listener?.(new MessageEvent('import', { data: JSON.stringify(event) }));
  }
}

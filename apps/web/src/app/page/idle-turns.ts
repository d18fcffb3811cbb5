/** Without word from the browser of how long it is idle, work goes on for so long at a time. */
const USUAL_TURN_MS = 8;

/**
 * Parts long work into turns in which the page has nothing better to do: await what this returns before every piece. It
 * rejects when the work is no longer wanted.
 */
export function idleTurns(signal: AbortSignal): () => Promise<void> {
  let turnEndsAtMs = 0;
  return async () => {
    if (performance.now() >= turnEndsAtMs) {
      turnEndsAtMs = performance.now() + (await idleTurnMs());
    }
    signal.throwIfAborted();
  };
}

function idleTurnMs(): Promise<number> {
  return new Promise((resolve) => {
    // Not every browser tells when it is idle: there the next turn of the loop must do.
    if ('requestIdleCallback' in globalThis) {
      requestIdleCallback((deadline) => {
        resolve(Math.max(USUAL_TURN_MS, deadline.timeRemaining()));
      });
    } else {
      setTimeout(() => {
        resolve(USUAL_TURN_MS);
      });
    }
  });
}

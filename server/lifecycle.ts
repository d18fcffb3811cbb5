/**
 * Calls `stop` once, on SIGTERM, on SIGINT, or when the process that started this one is gone:
 * a start command killed with -9 leaves nothing behind but a closed channel.
 */
export function onStop(stop: () => Promise<void>): void {
  let stopping = false;
  const go = (): void => {
    if (stopping) return;
    stopping = true;
    stop().then(
      () => process.exit(0),
      (error: unknown) => {
        console.error('The process could not stop cleanly.', error);
        process.exit(1);
      },
    );
  };
  process.on('SIGTERM', go);
  process.on('SIGINT', go);
  if (process.send) process.on('disconnect', go);
}

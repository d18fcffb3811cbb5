/** Processor time and not the clock's: other work on the machine must not count. */
export function processorSeconds(work: () => void): number {
  const start = process.cpuUsage();
  work();
  const { user, system } = process.cpuUsage(start);
  return (user + system) / 1e6;
}

/** The best of a few turns: the rest is warming up and other people's noise. */
export function bestOf(turns: number, work: () => void): number {
  let best = Infinity;
  for (let turn = 0; turn < turns; turn++) best = Math.min(best, processorSeconds(work));
  return best;
}

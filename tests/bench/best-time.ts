/**
 * Shortest time of one call, ms. Other work on the machine only ever adds to a time, so the shortest of many rounds
 * says most about the code.
 */
export function bestTime_ms(
  call: () => void,
  { rounds, calls }: { readonly rounds: number; readonly calls: number },
): number {
  let best = Infinity;
  for (let round = 0; round < rounds; round += 1) {
    const started = performance.now();
    for (let count = 0; count < calls; count += 1) call();
    best = Math.min(best, (performance.now() - started) / calls);
  }
  return best;
}

/** The same in time of the processor, which other work on a shared machine hardly lengthens. */
export function bestCpuTime_ms(
  call: () => void,
  { rounds, calls }: { readonly rounds: number; readonly calls: number },
): number {
  let best = Infinity;
  for (let round = 0; round < rounds; round += 1) {
    const started = process.cpuUsage();
    for (let count = 0; count < calls; count += 1) call();
    const { user, system } = process.cpuUsage(started);
    best = Math.min(best, (user + system) / 1000 / calls);
  }
  return best;
}

import { createCircuitRunner, type CircuitRunner } from '../circuit/circuit-runner';

/** Circuits solved in a worker of this browser's. */
export function browserCircuitRunner(): CircuitRunner {
  return createCircuitRunner({
    startWorker: () =>
      new Worker(new URL('../circuit/circuit-worker.ts', import.meta.url), { type: 'module' }),
    after: (ms, run) => {
      const timer = setTimeout(run, ms);
      return () => {
        clearTimeout(timer);
      };
    },
  });
}

import type { TraceReply, TraceRequest } from '../trace/trace-protocol';
import { createLatestRunner, type LatestRunner } from '../worker/latest-runner';

export type TraceRunner = LatestRunner<TraceRequest, TraceReply>;

/** Files of oscilloscopes read in a worker of this browser's: one question at a time, the latest wins. */
export function browserTraceRunner(): TraceRunner {
  return createLatestRunner<TraceRequest, TraceReply>({
    startWorker: () => new Worker(new URL('../trace/trace-worker.ts', import.meta.url), { type: 'module' }),
    after: (ms, run) => {
      const timer = setTimeout(run, ms);
      return () => {
        clearTimeout(timer);
      };
    },
    failedWords: 'The file could not be read: the part of the app that does it failed. Try once more.',
  });
}

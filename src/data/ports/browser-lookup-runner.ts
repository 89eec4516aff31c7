import type { LookupReply, LookupRequest } from '../lookup/lookup-protocol';
import { createLatestRunner, type LatestRunner } from '../worker/latest-runner';

export type LookupRunner = LatestRunner<LookupRequest, LookupReply>;

/** Slow lookups answered in a worker of this browser's: one question at a time, the latest wins. */
export function browserLookupRunner(): LookupRunner {
  return createLatestRunner<LookupRequest, LookupReply>({
    startWorker: () => new Worker(new URL('../lookup/lookup-worker.ts', import.meta.url), { type: 'module' }),
    after: (ms, run) => {
      const timer = setTimeout(run, ms);
      return () => {
        clearTimeout(timer);
      };
    },
    failedWords: 'It could not be computed: the part of the app that does it failed. Try once more.',
  });
}

import type { Reply } from '../worker/latest-runner';
import { traceReader } from './answer-trace';
import type { TraceReply, TraceRequest } from './trace-protocol';

const answer = traceReader();

addEventListener('message', ({ data }: MessageEvent<TraceRequest>) => {
  void answer(data).then(
    (result) => {
      const reply: Reply<TraceReply> = { no: data.no, result };
      postMessage(reply);
    },
    (bug: unknown) => {
      // A rejected promise stays inside the worker; thrown from a timer, the page hears of it as a crash.
      setTimeout(() => {
        throw bug;
      });
    },
  );
});

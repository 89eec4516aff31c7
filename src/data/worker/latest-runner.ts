import { refused, type Refusal, type Result } from '../../domain/units/result';

/** As much of a dedicated worker as is needed here. */
export interface RunnerWorker<Request> extends EventTarget {
  readonly postMessage: (request: Request) => void;
  readonly terminate: () => void;
}

/** Requests are numbered, so that a late reply is told from the one that is waited for. */
export interface Numbered {
  readonly no: number;
}

export interface Reply<Answer> extends Numbered {
  readonly result: Result<Answer>;
}

export interface LatestRunnerNeeds<Request> {
  /** May throw where the browser forbids workers. */
  readonly startWorker: () => RunnerWorker<Request>;
  /** Runs something after some ms; what it gives back calls that off. */
  readonly after: (ms: number, run: () => void) => () => void;
  /** What is said when the worker broke. */
  readonly failedWords: string;
}

export interface Asked<Answer> {
  /** Never rejects. Refused with `stopped` when cancelled or overtaken, with `worker-failed` when the worker broke. */
  readonly answer: Promise<Result<Answer>>;
  /** Ends the worker where it is at this request; nothing once the answer is there. */
  readonly cancel: () => void;
}

export interface LatestRunner<Request extends Numbered, Answer> {
  readonly ask: (request: Omit<Request, 'no'>) => Asked<Answer>;
  /** Stops whatever is going on and ends the worker. A later request starts a new one. */
  readonly close: () => void;
}

/**
 * How long an overtaken request may keep the worker, ms. Ended at once, a worker that is still loading would never come to
 * answer while somebody drags a slider; most requests take a few milliseconds.
 */
export const PATIENCE_MS = 1000;

const STOPPED: Refusal = { type: 'stopped', words: 'The computation was stopped.' };

interface Job<Request, Answer> {
  readonly request: Request;
  readonly settle: (result: Result<Answer>) => void;
}

/** Answers requests one at a time in a worker that is started when first needed. The latest request wins. */
export function createLatestRunner<Request extends Numbered, Answer>({
  startWorker,
  after,
  failedWords,
}: LatestRunnerNeeds<Request>): LatestRunner<Request, Answer> {
  type OwnJob = Job<Request, Answer>;
  const failure: Refusal = { type: 'worker-failed', words: failedWords };
  let worker: RunnerWorker<Request> | null = null;
  let running: OwnJob | null = null;
  let waiting: OwnJob | null = null;
  let callOffPatience: (() => void) | null = null;
  let last = 0;

  const endWorker = () => {
    worker?.terminate();
    worker = null;
  };
  const startNext = () => {
    callOffPatience?.();
    callOffPatience = null;
    running = waiting;
    waiting = null;
    if (running === null) return;
    try {
      worker ??= listenedTo(startWorker());
      worker.postMessage(running.request);
    } catch {
      running.settle(refused(failure));
      endWorker();
      running = null;
    }
  };
  const stop = (result: Result<Answer>) => {
    running?.settle(result);
    endWorker();
    startNext();
  };
  const listenedTo = (started: RunnerWorker<Request>): RunnerWorker<Request> => {
    started.addEventListener('message', (event) => {
      const { no, result } = (event as MessageEvent<Reply<Answer>>).data;
      if (started !== worker || no !== running?.request.no) return;
      running.settle(result);
      startNext();
    });
    const failed = () => {
      if (started === worker) stop(refused(failure));
    };
    started.addEventListener('error', failed);
    started.addEventListener('messageerror', failed);
    return started;
  };
  const enter = (job: OwnJob) => {
    waiting?.settle(refused(STOPPED));
    waiting = job;
    if (running === null) {
      startNext();
      return;
    }
    running.settle(refused(STOPPED));
    callOffPatience ??= after(PATIENCE_MS, () => {
      stop(refused(STOPPED));
    });
  };
  const cancel = (job: OwnJob) => {
    job.settle(refused(STOPPED));
    // A request that was overtaken is nobody's to cancel any more: the worker is the next one's.
    if (job !== (waiting ?? running)) return;
    waiting = null;
    stop(refused(STOPPED));
  };

  return {
    ask: (parts) => {
      last += 1;
      const request = { ...parts, no: last } as Request;
      let cancelThis = () => {};
      const answer = new Promise<Result<Answer>>((settle) => {
        const job = { request, settle };
        cancelThis = () => {
          cancel(job);
        };
        enter(job);
      });
      return {
        answer,
        cancel: () => {
          cancelThis();
        },
      };
    },
    close: () => {
      waiting?.settle(refused(STOPPED));
      waiting = null;
      stop(refused(STOPPED));
    },
  };
}

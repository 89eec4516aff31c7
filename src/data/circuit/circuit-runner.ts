import type { CircuitAnswer } from '../../domain/circuit/circuit-answer';
import type { Circuit } from '../../domain/circuit/circuit-input';
import { refused, type Refusal, type Result } from '../../domain/units/result';
import type { CircuitReply, CircuitRequest, SolveOptions } from './circuit-protocol';

/** As much of a dedicated worker as is needed here. */
export interface CircuitWorker extends EventTarget {
  readonly postMessage: (request: CircuitRequest) => void;
  readonly terminate: () => void;
}

export interface CircuitRunnerNeeds {
  /** May throw where the browser forbids workers. */
  readonly startWorker: () => CircuitWorker;
  /** Runs something after some ms; what it gives back calls that off. */
  readonly after: (ms: number, run: () => void) => () => void;
}

export interface CircuitSolve {
  /** Never rejects. Refused with `stopped` when cancelled or overtaken, with `worker-failed` when the worker broke. */
  readonly answer: Promise<Result<CircuitAnswer>>;
  /** Ends the worker where it is at this solve; nothing once the answer is there. */
  readonly cancel: () => void;
}

export interface CircuitRunner {
  readonly solve: (circuit: Circuit, options?: SolveOptions) => CircuitSolve;
  /** Stops whatever is going on and ends the worker. A later solve starts a new one. */
  readonly close: () => void;
}

/**
 * How long an overtaken solve may keep the worker, ms. Ended at once, a worker that is still loading would never come to
 * answer while somebody drags a slider; most solves take a few milliseconds.
 */
export const PATIENCE_MS = 1000;

const STOPPED: Refusal = { type: 'stopped', words: 'The computation was stopped.' };
const FAILED: Refusal = {
  type: 'worker-failed',
  words: 'The circuit could not be computed: the part of the app that does it failed. Try once more.',
};

interface Job {
  readonly request: CircuitRequest;
  readonly settle: (result: Result<CircuitAnswer>) => void;
}

/** Solves circuits one at a time in a worker that is started when first needed. The latest circuit wins. */
export function createCircuitRunner({ startWorker, after }: CircuitRunnerNeeds): CircuitRunner {
  let worker: CircuitWorker | null = null;
  let running: Job | null = null;
  let waiting: Job | null = null;
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
      running.settle(refused(FAILED));
      endWorker();
      running = null;
    }
  };
  const stop = (result: Result<CircuitAnswer>) => {
    running?.settle(result);
    endWorker();
    startNext();
  };
  const listenedTo = (started: CircuitWorker): CircuitWorker => {
    started.addEventListener('message', (event) => {
      const { no, result } = (event as MessageEvent<CircuitReply>).data;
      if (started !== worker || no !== running?.request.no) return;
      running.settle(result);
      startNext();
    });
    const failed = () => {
      if (started === worker) stop(refused(FAILED));
    };
    started.addEventListener('error', failed);
    started.addEventListener('messageerror', failed);
    return started;
  };
  const enter = (job: Job) => {
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
  const cancel = (job: Job) => {
    job.settle(refused(STOPPED));
    // A solve that was overtaken is nobody's to cancel any more: the worker is the next one's.
    if (job !== (waiting ?? running)) return;
    waiting = null;
    stop(refused(STOPPED));
  };

  return {
    solve: (circuit, options = {}) => {
      last += 1;
      const request = { no: last, circuit, options: sendable(options) };
      let cancelThis = () => {};
      const answer = new Promise<Result<CircuitAnswer>>((settle) => {
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

/** A function among the options, let through by their type, could not be sent. */
function sendable({ samples, wantedRise_s, tolerance }: SolveOptions): SolveOptions {
  return {
    ...(samples === undefined ? {} : { samples }),
    ...(wantedRise_s === undefined ? {} : { wantedRise_s }),
    ...(tolerance === undefined ? {} : { tolerance }),
  };
}

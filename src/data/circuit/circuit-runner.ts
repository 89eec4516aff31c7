import type { CircuitAnswer } from '../../domain/circuit/circuit-answer';
import type { Circuit } from '../../domain/circuit/circuit-input';
import {
  createLatestRunner,
  type Asked,
  type LatestRunnerNeeds,
  type RunnerWorker,
} from '../worker/latest-runner';
import type { CircuitRequest, SolveOptions } from './circuit-protocol';

export type CircuitWorker = RunnerWorker<CircuitRequest>;
export type CircuitRunnerNeeds = Omit<LatestRunnerNeeds<CircuitRequest>, 'failedWords'>;
export type CircuitSolve = Asked<CircuitAnswer>;

export interface CircuitRunner {
  readonly solve: (circuit: Circuit, options?: SolveOptions) => CircuitSolve;
  /** Stops whatever is going on and ends the worker. A later solve starts a new one. */
  readonly close: () => void;
}

/** Solves circuits one at a time in a worker that is started when first needed. The latest circuit wins. */
export function createCircuitRunner(needs: CircuitRunnerNeeds): CircuitRunner {
  const runner = createLatestRunner<CircuitRequest, CircuitAnswer>({
    ...needs,
    failedWords: 'The circuit could not be computed: the part of the app that does it failed. Try once more.',
  });
  return {
    solve: (circuit, options = {}) => runner.ask({ circuit, options: sendable(options) }),
    close: runner.close,
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

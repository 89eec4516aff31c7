import type { CircuitAnswer } from '../../domain/circuit/circuit-answer';
import type { Circuit } from '../../domain/circuit/circuit-input';
import type { TransientOptions } from '../../domain/circuit/transient';
import type { Result } from '../../domain/units/result';

/** What of a solve's options can be sent to a worker: a question asked meanwhile cannot. */
export type SolveOptions = Omit<TransientOptions, 'shouldStop'>;

export interface CircuitRequest {
  readonly no: number;
  readonly circuit: Circuit;
  readonly options: SolveOptions;
}

export interface CircuitReply {
  readonly no: number;
  readonly result: Result<CircuitAnswer>;
}

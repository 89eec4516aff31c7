import type { Answer } from '../../src/domain/units/answer';
import type { Result } from '../../src/domain/units/result';
import { ALIGNMENT_FUNCTIONS } from './fn-alignment';
import { BEAM_FUNCTIONS } from './fn-beam';
import { CAPACITOR_FUNCTIONS } from './fn-capacitor';
import { CHANNEL_FUNCTIONS } from './fn-channel';
import { CIRCUIT_FUNCTIONS } from './fn-circuit';
import { GAP_FUNCTIONS } from './fn-gap';
import { GAS_FUNCTIONS } from './fn-gas';
import { LINE_FUNCTIONS } from './fn-line';
import { SPARK_FUNCTIONS } from './fn-spark';
import type { Inputs } from './inputs';

/** What the project gives for one check. */
export type Evaluated = Result<Answer> | Result<number> | Result<boolean>;

/** A check that the project cannot answer yet, and why. */
export interface Skipped {
  readonly skip: string;
}

export type ReferenceFunction = (inputs: Inputs) => Evaluated | Skipped;

/** Every function name of the check format that the project knows, and the public function behind it. */
export const FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  ...GAP_FUNCTIONS,
  ...CAPACITOR_FUNCTIONS,
  ...SPARK_FUNCTIONS,
  ...LINE_FUNCTIONS,
  ...CIRCUIT_FUNCTIONS,
  ...CHANNEL_FUNCTIONS,
  ...ALIGNMENT_FUNCTIONS,
  ...GAS_FUNCTIONS,
  ...BEAM_FUNCTIONS,
};

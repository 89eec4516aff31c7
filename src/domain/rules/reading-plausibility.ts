import type { ReadingValues } from '../book/bodies/firing-bodies';
import type { RigSpec } from '../book/rig-spec';
import { plausibility, type OwnExpectation, type Plausibility } from '../calibration/plausibility';
import type { Result } from '../units/result';
import { gapInputOf } from './rig-gap';

/** How a reading compares with what physics expects of the revision that it was taken on. */
export function readingPlausibility(
  spec: RigSpec,
  values: ReadingValues,
  before: readonly number[],
): Result<Plausibility> {
  return plausibilityAgainst(spec, values, { before, own: undefined });
}

export interface ComparedWith {
  /** Sigmas of the self-breaks just before, newest first. */
  readonly before: readonly number[];
  /** By the rig's own calibration, where it has one. */
  readonly own: OwnExpectation | undefined;
}

/** The same with the rig's own curve in the law's place where it has one. */
export function plausibilityAgainst(
  spec: RigSpec,
  values: ReadingValues,
  { before, own }: ComparedWith,
): Result<Plausibility> {
  const gap = { ...gapInputOf(spec, values), gas: values.gas };
  return plausibility({
    gap,
    how: values.how,
    voltage_kV: values.voltage_kV,
    broke: values.looked !== 'gap-dark',
    before,
    own,
  });
}

import type { ReadingValues } from '../book/bodies/firing-bodies';
import type { RigSpec } from '../book/rig-spec';
import { plausibility, type Plausibility } from '../calibration/plausibility';
import type { Result } from '../units/result';
import { gapInputOf } from './rig-gap';

/** How a reading compares with what physics expects of the revision that it was taken on. */
export function readingPlausibility(
  spec: RigSpec,
  values: ReadingValues,
  before: readonly number[],
): Result<Plausibility> {
  const gap = { ...gapInputOf(spec, values), gas: values.gas };
  return plausibility({
    gap,
    how: values.how,
    voltage_kV: values.voltage_kV,
    broke: values.looked !== 'gap-dark',
    before,
  });
}

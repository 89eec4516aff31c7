import { ok, type Refusal, type Result } from '../units/result';
import type { GapSetup } from './gap-input';
import { buildGapModel, voltagesAt } from './gap-model';
import { HIGH_FIELD_MV_M } from './high-field';

/** One point of a curve over pressure; outside the model it carries the reason instead of voltages. */
export type GapCurvePoint =
  | {
      readonly valid: true;
      readonly pressure_bar_abs: number;
      readonly law_kV: number;
      readonly low_kV: number;
      readonly high_kV: number;
      readonly highField: boolean;
    }
  | { readonly valid: false; readonly pressure_bar_abs: number; readonly refusal: Refusal };

/**
 * Law and both sides over a list of absolute pressures, in its order. A point outside the model's range stays in
 * the list and says so, for the chart to leave bare; a gap that is refused as a whole refuses the curve.
 */
export function gapCurve(
  setup: GapSetup,
  pressures_bar_abs: readonly number[],
): Result<readonly GapCurvePoint[]> {
  const model = buildGapModel(setup);
  if (!model.ok) return model;
  return ok(
    pressures_bar_abs.map((pressure_bar_abs): GapCurvePoint => {
      const voltages = voltagesAt(model.value, pressure_bar_abs);
      if (!voltages.ok) return { valid: false, pressure_bar_abs, refusal: voltages.refusal };
      const { law_kV, low_kV, high_kV, peakField_MV_m } = voltages.value;
      return {
        valid: true,
        pressure_bar_abs,
        law_kV,
        low_kV,
        high_kV,
        highField: peakField_MV_m > HIGH_FIELD_MV_M,
      };
    }),
  );
}

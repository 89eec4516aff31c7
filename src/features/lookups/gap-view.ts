import type { RigSpec } from '../../domain/book/rig-spec';
import { reachableVoltage, supplyReach, type SupplyReach } from '../../domain/charging/supply-reach';
import { gapCurve } from '../../domain/gap/gap-curve';
import type { GapInput, GapSetup } from '../../domain/gap/gap-input';
import { gapFor, pressureFor, type GapSolution } from '../../domain/gap/gap-solve';
import { selfBreak, type GapAnswer } from '../../domain/gap/self-break';
import { chargingOf } from '../../domain/rules/rig-figures';
import { ok, refused, type Refusal, type Result } from '../../domain/units/result';
import { absolutePressure, SETTING_ERRORS, type GapForm } from './gap-form';

export interface GapView {
  readonly answer: GapAnswer;
  readonly input: GapInput;
  /** Set when a pressure or a gap was solved for. */
  readonly solution: GapSolution | null;
}

/** The two-sided answer at the form's values, or the first refusal in words. */
export function gapView(form: GapForm): Result<GapView> {
  const missing = firstMissing(form);
  if (missing !== null) return refused(missing);
  const { gap_mm, temperature_C, radius_mm, voltage_kV } = form.values;
  const setup: GapSetup = {
    gas: form.gas,
    electrodes: { shape: radius_mm === null ? 'plane' : 'domed', radius_mm },
    gap_mm: gap_mm ?? 0,
    u_gap_mm: form.gap_error_mm,
    u_pressure_bar: SETTING_ERRORS.pressure_bar,
    temperature_C: temperature_C ?? 0,
    u_temperature_C: SETTING_ERRORS.temperature_C,
    irradiated: form.irradiated,
  };
  const target = { purpose: form.purpose, voltage_kV: voltage_kV ?? 0 };
  if (form.find === 'pressure') {
    const solution = pressureFor(setup, target);
    if (!solution.ok) return solution;
    return ok({
      answer: solution.value.gap,
      input: { ...setup, pressure: { bar_abs: solution.value.value } },
      solution: solution.value,
    });
  }
  const pressure = absolutePressure(form);
  if (!pressure.ok) return pressure;
  const at = { pressure: { bar_abs: pressure.value } };
  if (form.find === 'gap') {
    const solution = gapFor({ ...setup, ...at }, target);
    if (!solution.ok) return solution;
    return ok({
      answer: solution.value.gap,
      input: { ...setup, ...at, gap_mm: solution.value.value },
      solution: solution.value,
    });
  }
  const answer = selfBreak({ ...setup, ...at });
  return answer.ok ? ok({ answer: answer.value, input: { ...setup, ...at }, solution: null }) : answer;
}

function firstMissing(form: GapForm): Refusal | null {
  const asked = ['gap_mm', 'temperature_C', 'voltage_kV'] as const;
  for (const field of asked) {
    if (field === 'gap_mm' && form.find === 'gap') continue;
    if (field === 'voltage_kV' && form.find === 'voltage') continue;
    if (form.values[field] === null) {
      const name = { gap_mm: 'Gap', temperature_C: 'Temperature', voltage_kV: 'Voltage' }[field];
      return { type: 'empty', field, words: `${name}: enter a number.` };
    }
  }
  if (form.values.ambient_bar_abs === null) {
    return {
      type: 'no-ambient',
      field: 'ambient_bar_abs',
      words: 'Ambient: enter the ambient pressure; it has no default.',
    };
  }
  return null;
}

export interface GapCurves {
  readonly band: readonly { readonly x: number; readonly low: number; readonly high: number }[];
  readonly law: readonly { readonly x: number; readonly y: number }[];
  /** Gauge pressure from which the model no longer holds, inside the drawn range. */
  readonly notValidFrom: number | null;
}

const CURVE_POINTS = 80;

/** Curves over gauge pressure, from `from_bar_g` to `to_bar_g`. */
export function gapCurves(
  input: GapInput,
  ambient_bar_abs: number,
  range: { readonly from_bar_g: number; readonly to_bar_g: number },
): GapCurves {
  const gauge = Array.from(
    { length: CURVE_POINTS + 1 },
    (_, i) => range.from_bar_g + ((range.to_bar_g - range.from_bar_g) * i) / CURVE_POINTS,
  );
  const curve = gapCurve(
    input,
    gauge.map((bar_g) => bar_g + ambient_bar_abs),
  );
  if (!curve.ok) return { band: [], law: [], notValidFrom: null };
  const points = curve.value.flatMap((point) =>
    point.valid ? [{ ...point, x: point.pressure_bar_abs - ambient_bar_abs }] : [],
  );
  const last = points.at(-1)?.x ?? range.to_bar_g;
  return {
    band: points.map(({ x, low_kV, high_kV }) => ({ x, low: low_kV, high: high_kV })),
    law: points.map(({ x, law_kV }) => ({ x, y: law_kV })),
    notValidFrom: last < range.to_bar_g - 1e-9 ? last : null,
  };
}

export interface SupplyWords {
  readonly reachable_kV: number;
  readonly reach: SupplyReach;
}

/** What the rig's supply can do against this gap, for the caution beside the answer. */
export function supplyAgainst(spec: RigSpec, answer: GapAnswer): SupplyWords | null {
  const charging = chargingOf(spec);
  const reachable = reachableVoltage(charging);
  const reach = supplyReach(charging, answer);
  return reachable.ok && reach.ok ? { reachable_kV: reachable.value.value, reach: reach.value } : null;
}

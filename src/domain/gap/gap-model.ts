import { checkNumber } from '../units/check-number';
import { ok, refused, type Refusal, type Result } from '../units/result';
import { cylinderProfile, sphereProfiles, type AxialProfile } from './field-geometry';
import { similarity_bar_cm } from './gas-density';
import { gasLaw, type GasLaw } from './gas-law';
import {
  checkSetup,
  FULLY_VALID_FROM_BAR_CM,
  GAP_PRESSURE_RULE,
  HIGHEST_X_BAR_CM,
  LOWEST_X_BAR_CM,
  type GapSetup,
} from './gap-input';
import { highFieldShare } from './high-field';
import { streamerVoltage_kV } from './streamer';

const MM_PER_CM = 10;

// Physics M. Spheres and planes, cylinders, and any shape at small pd; then the high side, and the gap without UV.
const LOW_SHARE = 0.95;
const LOW_SHARE_CYLINDERS = 0.92;
const LOW_SHARE_SMALL_PD = 0.9;
const HIGH_SHARE = 1.05;
const HIGH_SHARE_WITHOUT_UV = 1.2;

/** A gap with its field worked out once, to be asked at many pressures. */
export interface GapModel {
  readonly setup: GapSetup;
  readonly law: GasLaw;
  readonly radius_mm: number | undefined;
  /** Field at the setting; undefined where it is uniform. */
  readonly field: AxialProfile | undefined;
  /** Fields at the narrowest gap the setting error allows; the lowest result counts. */
  readonly narrowFields: readonly (AxialProfile | undefined)[];
}

/** Both sides and the law at one pressure, without words. */
export interface GapVoltages {
  readonly x_bar_cm: number;
  /** x with every setting error against the hold-off. */
  readonly lowest_x_bar_cm: number;
  readonly law_kV: number;
  readonly low_kV: number;
  readonly high_kV: number;
  readonly peakField_MV_m: number;
}

/** Checks a gap and works out its fields; refused by field, or where the gas has no law. */
export function buildGapModel(setup: GapSetup): Result<GapModel> {
  const law = gasLaw(setup.gas);
  if (!law.ok) return law;
  const checked = checkSetup(setup);
  if (!checked.ok) return checked;
  const { radius_mm } = checked.value;
  const narrow_mm = setup.gap_mm - setup.u_gap_mm;
  return ok({
    setup,
    law: law.value,
    radius_mm,
    field: fieldsOf(setup, radius_mm, setup.gap_mm)[0],
    narrowFields: fieldsOf(setup, radius_mm, narrow_mm),
  });
}

/** Voltages at one absolute pressure; refused outside 0.013 to 5 bar cm and above 5 bar. */
export function voltagesAt(model: GapModel, pressure_bar_abs: number): Result<GapVoltages> {
  const pressure = checkNumber(pressure_bar_abs, GAP_PRESSURE_RULE);
  if (!pressure.ok) return pressure;
  const { setup, law } = model;
  const gap_cm = setup.gap_mm / MM_PER_CM;
  const u_gap_cm = setup.u_gap_mm / MM_PER_CM;
  const bar = pressure.value;
  const x = similarity_bar_cm({ pressure_bar_abs: bar, gap_cm, temperature_C: setup.temperature_C });
  const lowest = {
    pressure_bar_abs: bar - setup.u_pressure_bar,
    gap_cm: gap_cm - u_gap_cm,
    temperature_C: setup.temperature_C + setup.u_temperature_C,
  };
  const lowX = similarity_bar_cm(lowest);
  const outside = refusalOutside({ x, lowX, lowBar: lowest.pressure_bar_abs });
  if (outside !== undefined) return refused(outside);
  const highX = similarity_bar_cm({
    pressure_bar_abs: bar + setup.u_pressure_bar,
    gap_cm: gap_cm + u_gap_cm,
    temperature_C: setup.temperature_C - setup.u_temperature_C,
  });
  const law_kV = law.factor(x) * streamerVoltage_kV(law.criterion, x, model.field);
  const uv = setup.irradiated ? 1 : HIGH_SHARE_WITHOUT_UV;
  return ok({
    x_bar_cm: x,
    lowest_x_bar_cm: lowX,
    law_kV,
    low_kV: lowSide_kV(model, lowX, lowest.gap_cm),
    high_kV: law.highest_kV(highX) * HIGH_SHARE * uv,
    peakField_MV_m: peakField_MV_m(law_kV, gap_cm, model.field),
  });
}

function fieldsOf(
  setup: GapSetup,
  radius_mm: number | undefined,
  gap_mm: number,
): readonly (AxialProfile | undefined)[] {
  if (radius_mm === undefined) return [undefined];
  const x = gap_mm / radius_mm;
  if (setup.electrodes.shape === 'cylinder') return [cylinderProfile(x)];
  const { symmetric, oneEarthed } = sphereProfiles(x);
  return [symmetric, oneEarthed];
}

// The high-field factor is taken at the law's voltage, before the other factors: that errs towards a lower side.
function lowSide_kV({ law, setup, narrowFields }: GapModel, x: number, gap_cm: number): number {
  const share =
    x < FULLY_VALID_FROM_BAR_CM
      ? LOW_SHARE_SMALL_PD
      : setup.electrodes.shape === 'cylinder'
        ? LOW_SHARE_CYLINDERS
        : LOW_SHARE;
  let lowest = Infinity;
  for (const field of narrowFields) {
    const voltage = law.factor(x) * streamerVoltage_kV(law.criterion, x, field);
    lowest = Math.min(lowest, voltage * highFieldShare(peakField_MV_m(voltage, gap_cm, field)));
  }
  return lowest * share * law.lowMargin;
}

function peakField_MV_m(voltage_kV: number, gap_cm: number, field: AxialProfile | undefined): number {
  return ((field?.fieldFactor ?? 1) * voltage_kV) / (gap_cm * MM_PER_CM);
}

interface Outside {
  readonly x: number;
  readonly lowX: number;
  readonly lowBar: number;
}

function refusalOutside({ x, lowX, lowBar }: Outside): Refusal | undefined {
  if (x < LOWEST_X_BAR_CM) {
    return {
      type: 'pd-too-small',
      field: 'pressure',
      words: `Pressure times gap is below ${String(LOWEST_X_BAR_CM)}\u2009bar cm. There the cathode decides, and no side can be given.`,
    };
  }
  if (x > HIGHEST_X_BAR_CM) {
    return {
      type: 'pd-too-large',
      field: 'pressure',
      words: `Pressure times gap is above ${String(HIGHEST_X_BAR_CM)}\u2009bar cm, beyond the range of the two-sided rule.`,
    };
  }
  if (lowBar <= 0) {
    return {
      type: 'error-too-large',
      field: 'u_pressure_bar',
      words: 'Setting error of the pressure: must be smaller than the absolute pressure.',
    };
  }
  if (lowX < LOWEST_X_BAR_CM) {
    return {
      type: 'pd-too-small',
      field: 'pressure',
      words: `With the setting errors, pressure times gap may fall below ${String(LOWEST_X_BAR_CM)}\u2009bar cm, where no side can be given.`,
    };
  }
  return undefined;
}

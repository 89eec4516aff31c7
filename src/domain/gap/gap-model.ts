import { checkNumber } from '../units/check-number';
import { ok, refused, type Refusal, type Result } from '../units/result';
import type { CheckedElectrodes } from './electrodes';
import { fieldsAt, leastFieldsAt, type GapField } from './gap-fields';
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

// Physics M, by what the field is known from; then any shape at small pd, the high side, and the gap without UV.
const LOW_SHARES = {
  plane: 0.95,
  domed: 0.95,
  sphere: 0.95,
  'capped-rods': 0.95,
  cylinder: 0.92,
  'hex-bars': 0.92,
} as const;
const LOW_SHARE_SMALL_PD = 0.9;
const HIGH_SHARE = 1.05;
const HIGH_SHARE_WITHOUT_UV = 1.2;

/** A gap that has been checked. */
export interface CheckedGap {
  readonly setup: GapSetup;
  readonly law: GasLaw;
  readonly electrodes: CheckedElectrodes;
}

/** A gap with its fields worked out once, to be asked at many pressures. */
export interface GapModel extends CheckedGap {
  /** Fields at the setting along the ways that may break first; the weakest counts. */
  readonly fields: readonly GapField[];
  /** Fields of the low side, at the narrowest gap the setting error allows; the weakest counts. */
  readonly leastFields: readonly GapField[];
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

/** One of the three faces of an answer. */
export type GapSide = 'low' | 'high' | 'law';

/** Checks a gap; refused by field, or where the gas has no law. */
export function checkGap(setup: GapSetup): Result<CheckedGap> {
  const law = gasLaw(setup.gas);
  if (!law.ok) return law;
  const electrodes = checkSetup(setup);
  return electrodes.ok ? ok({ setup, law: law.value, electrodes: electrodes.value }) : electrodes;
}

/** Checks a gap and works out its fields; refused as `checkGap` does. */
export function buildGapModel(setup: GapSetup): Result<GapModel> {
  const gap = checkGap(setup);
  if (!gap.ok) return gap;
  const { electrodes } = gap.value;
  const fields = fieldsAt(electrodes, setup.gap_mm);
  if (!fields.ok) return fields;
  const leastFields = leastFieldsAt(electrodes, narrow_mm(setup));
  if (!leastFields.ok) return leastFields;
  return ok({ ...gap.value, fields: fields.value, leastFields: leastFields.value });
}

/** Voltages at one absolute pressure; refused outside 0.013 to 5 bar cm and above 5 bar. */
export function voltagesAt(model: GapModel, pressure_bar_abs: number): Result<GapVoltages> {
  const point = similarityAt(model.setup, pressure_bar_abs);
  if (!point.ok) return point;
  const { setup, law } = model;
  const { x, lowX, highX } = point.value;
  const weakest = weakestAt(law, x, model.fields);
  return ok({
    x_bar_cm: x,
    lowest_x_bar_cm: lowX,
    law_kV: weakest.voltage_kV,
    low_kV: lowSide_kV(model, lowX, model.leastFields),
    high_kV: highSide_kV(model, highX),
    peakField_MV_m: peakField_MV_m(weakest.voltage_kV, setup.gap_mm, weakest.field),
  });
}

/** One side alone at one pressure; NaN where `voltagesAt` would refuse. */
export function modelSideAt(model: GapModel, pressure_bar_abs: number, side: GapSide): number {
  const point = similarityAt(model.setup, pressure_bar_abs);
  if (!point.ok) return Number.NaN;
  const { x, lowX, highX } = point.value;
  if (side === 'high') return highSide_kV(model, highX);
  return side === 'law'
    ? weakestAt(model.law, x, model.fields).voltage_kV
    : lowSide_kV(model, lowX, model.leastFields);
}

/**
 * The same for a checked gap whose setting may have moved since: only the fields that this side needs are worked out.
 */
export function sideAt(gap: CheckedGap, pressure_bar_abs: number, side: GapSide): number {
  const { electrodes, setup } = gap;
  const none = ok([]);
  const fields = side === 'law' ? fieldsAt(electrodes, setup.gap_mm) : none;
  const leastFields = side === 'low' ? leastFieldsAt(electrodes, narrow_mm(setup)) : none;
  return fields.ok && leastFields.ok
    ? modelSideAt({ ...gap, fields: fields.value, leastFields: leastFields.value }, pressure_bar_abs, side)
    : Number.NaN;
}

function narrow_mm(setup: GapSetup): number {
  return setup.gap_mm - setup.u_gap_mm;
}

interface Similarity {
  readonly x: number;
  /** With every setting error against the hold-off, and for it. */
  readonly lowX: number;
  readonly highX: number;
}

function similarityAt(setup: GapSetup, pressure_bar_abs: number): Result<Similarity> {
  const pressure = checkNumber(pressure_bar_abs, GAP_PRESSURE_RULE);
  if (!pressure.ok) return pressure;
  const bar = pressure.value;
  const gap_cm = setup.gap_mm / MM_PER_CM;
  const u_gap_cm = setup.u_gap_mm / MM_PER_CM;
  const x = similarity_bar_cm({ pressure_bar_abs: bar, gap_cm, temperature_C: setup.temperature_C });
  const lowBar = bar - setup.u_pressure_bar;
  const lowX = similarity_bar_cm({
    pressure_bar_abs: lowBar,
    gap_cm: gap_cm - u_gap_cm,
    temperature_C: setup.temperature_C + setup.u_temperature_C,
  });
  const outside = refusalOutside({ x, lowX, lowBar });
  if (outside !== undefined) return refused(outside);
  const highX = similarity_bar_cm({
    pressure_bar_abs: bar + setup.u_pressure_bar,
    gap_cm: gap_cm + u_gap_cm,
    temperature_C: setup.temperature_C - setup.u_temperature_C,
  });
  return ok({ x, lowX, highX });
}

interface Weakest {
  readonly voltage_kV: number;
  readonly field: GapField;
}

function weakestAt(law: GasLaw, x: number, fields: readonly GapField[]): Weakest {
  const factor = law.factor(x);
  let weakest: Weakest = { voltage_kV: Infinity, field: undefined };
  for (const field of fields) {
    const voltage_kV = factor * streamerVoltage_kV(law.criterion, x, field);
    if (voltage_kV < weakest.voltage_kV) weakest = { voltage_kV, field };
  }
  return weakest;
}

function highSide_kV({ law, setup }: CheckedGap, x: number): number {
  return law.highest_kV(x) * HIGH_SHARE * (setup.irradiated ? 1 : HIGH_SHARE_WITHOUT_UV);
}

// The high-field factor is taken at the law's voltage, before the other factors: that errs towards a lower side.
function lowSide_kV({ law, setup, electrodes }: CheckedGap, x: number, fields: readonly GapField[]): number {
  const share = x < FULLY_VALID_FROM_BAR_CM ? LOW_SHARE_SMALL_PD : LOW_SHARES[electrodes.shape];
  const factor = law.factor(x);
  const gap_mm = narrow_mm(setup);
  let lowest = Infinity;
  for (const field of fields) {
    const voltage = factor * streamerVoltage_kV(law.criterion, x, field);
    lowest = Math.min(lowest, voltage * highFieldShare(peakField_MV_m(voltage, gap_mm, field)));
  }
  return lowest * share * law.lowMargin;
}

function peakField_MV_m(voltage_kV: number, gap_mm: number, field: GapField): number {
  return ((field?.fieldFactor ?? 1) * voltage_kV) / gap_mm;
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
